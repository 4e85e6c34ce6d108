export { toCandidateModel, type CatalogueEntry } from './entries';
export { catalogueList, catalogueVendors, readCatalogueAddress } from './list';
export { catalogueEntries, forgetCatalogue } from './memory';
export { approvedModelOf, moduleHistory, moduleShown } from './model';
