import { readiness } from '@/app/_server/readiness';

/** The process can do its work: the database answers and its schema is the one that the code expects. */
export const GET = readiness;
export const dynamic = 'force-dynamic';
