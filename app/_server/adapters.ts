export { downloadRoute } from './download-route';
export { formAction, sessionAction, endSessionAction } from './form-action';
export { jsonRoute } from './json-route';
export { uploadRoute } from './upload-route';
export type { FormState } from './form-state';
