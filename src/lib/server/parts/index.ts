export { addModule, changeModule, moduleById, moduleName, toModuleView, vendorList } from './modules';
