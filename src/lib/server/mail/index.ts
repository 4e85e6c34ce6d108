export { deliverMail, keepMailGoing, outbox, requeueMailInHand, waitAfter } from './queue';
export { forgetTransport, remembered, sendMail, type Delivery } from './transport';
export { tellLibrarians, tellOwner } from './letters';
