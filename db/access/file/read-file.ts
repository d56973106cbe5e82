import type { Context } from '@/db/access/context';
import { parse } from '@/db/access/parse';
import { allow } from '@/db/access/policy';
import { files } from '@/db/schema/files';
import { AppError } from '@/lib/errors';
import { byIdSchema } from '@/lib/schemas/common';
import { and, eq } from 'drizzle-orm';

export interface StoredFile {
  name: string;
  bytes: Uint8Array;
  sha256: string;
}

/** An original file, byte for byte. */
export async function readFile(ctx: Context, input: unknown): Promise<StoredFile> {
  const viewer = allow(ctx, 'read');
  const { id } = parse(byIdSchema, input);
  const [file] = await ctx.db
    .select({ name: files.name, bytes: files.bytes, sha256: files.sha256 })
    .from(files)
    .where(and(eq(files.id, id), eq(files.teamId, viewer.teamId)));
  if (file === undefined) throw new AppError('not_found', 'There is no such file.');
  return file;
}
