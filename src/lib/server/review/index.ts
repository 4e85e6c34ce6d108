export { evidence } from './evidence';
export { reviewCount, reviewQueue } from './queue';
export { approve, handIn, restore, returnToOwner, takeBack, withdraw } from './transitions';
