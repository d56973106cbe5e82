import type { Handle } from '@/db/access/context';
import { reviewEvents } from '@/db/schema/review-events';
import type { ReviewEvent } from '@/lib/schemas/fit';
import { randomUUID } from 'node:crypto';

interface NewEvent {
  fitId: string;
  kind: ReviewEvent['kind'];
  body: string;
  target?: string;
  personId: string;
  at: Date;
}

export async function addEvent(tx: Handle, event: NewEvent): Promise<string> {
  const id = randomUUID();
  await tx.insert(reviewEvents).values({ target: '', ...event, id });
  return id;
}
