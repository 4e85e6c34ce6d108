export { evidence } from './evidence';
export { hashOfStored, storedModel } from './model-hash';
export { reviewCount, reviewQueue } from './queue';
export { approve, handIn, restore, returnToOwner, takeBack, withdraw } from './transitions';
