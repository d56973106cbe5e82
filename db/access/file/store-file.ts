import type { Handle } from '@/db/access/context';
import { sha256 } from '@/db/access/sha256';
import { files } from '@/db/schema/files';
import { randomUUID } from 'node:crypto';

interface FileToStore {
  teamId: string;
  userId: string;
  now: Date;
  name: string;
  bytes: Uint8Array;
}

/** Keeps a file byte for byte with its hash; answers its id. */
export async function storeFile(tx: Handle, file: FileToStore): Promise<string> {
  const id = randomUUID();
  await tx.insert(files).values({
    id,
    teamId: file.teamId,
    name: file.name,
    bytes: Buffer.from(file.bytes),
    byteLength: file.bytes.byteLength,
    sha256: sha256(file.bytes),
    createdAt: file.now,
    createdById: file.userId,
  });
  return id;
}
