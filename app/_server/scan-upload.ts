import { AppError } from '@/lib/errors';
import { MAX_FILE_BYTES } from '@/lib/inversion/index';

import type { Upload } from './upload-route';

/** One file and room for the details beside it. */
export const scanUpload: Upload = {
  files: 1,
  totalBytes: MAX_FILE_BYTES + 1024 * 1024,
  toInput: (details, [file]) => {
    if (file === undefined) throw new AppError('invalid', 'Choose a file.', { file: 'Missing.' });
    const { reading, ...rest } = { reading: undefined, ...details };
    return { ...rest, source: { kind: 'file', reading, ...file } };
  },
};
