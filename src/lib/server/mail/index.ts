export { deliverMail, keepMailGoing, requeueMailInHand, waitAfter } from './queue';
export { forgetTransport, remembered, sendMail, type Delivery } from './transport';
export { tellLibrarians, tellOwner } from './letters';
export { outbox } from './outbox';
