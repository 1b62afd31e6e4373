export { deliverMessages, startDelivery } from './deliver-messages';
export { createMailTransport, type MailTransport } from './mail-transport';
export { messagesRoutes } from './messages-router';
export { postMessage, postMessages, type LinkRef, type MessageData, type OutgoingMessage } from './post-message';
