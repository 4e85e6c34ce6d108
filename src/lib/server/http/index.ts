export { endpoint, withVersion, versionTag, type Call } from './endpoint';
export { problemResponse } from './problem';
export { orPage, requirePage } from './page';
export { readUpload, type UploadedFile } from './upload';
