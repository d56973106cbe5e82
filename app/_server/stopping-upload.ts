import type { Upload } from './upload-route';

export const stoppingUpload: Upload = {
  files: 200,
  totalBytes: 20 * 1024 * 1024,
  toInput: (details, files) => ({ ...details, files }),
};
