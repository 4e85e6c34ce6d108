export { addModule, changeModule, moduleById, moduleName, toModuleView, vendorList } from './modules';
export { vendorFor } from './vendors';
