export { addSheet, changeSheet, sheetById, sheetFor, sheetList, sheetsSeen } from './sheets';
export { takePageOff, uploadPage } from './pages';
export { intakePng, originalFile, thumbnail } from './pictures';
export { pictureUrl, sheetName, toPageView, toPictureView } from './views';
