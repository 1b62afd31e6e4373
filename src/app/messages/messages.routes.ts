import type { Routes } from '@angular/router';

export const messagesRoutes: Routes = [
  {
    path: '',
    title: 'Messages',
    loadComponent: () => import('./messages-page/messages-page').then((m) => m.MessagesPage),
  },
  {
    path: ':messageId',
    title: 'Message',
    loadComponent: () => import('./message-page/message-page').then((m) => m.MessagePage),
  },
];
