import { operation } from '../operation';
import { ChangePassword, Me, UpdateMe } from '../schemas/me';

export const readMe = operation({
  id: 'readMe',
  method: 'get',
  path: '/me',
  area: 'You',
  summary: 'Who I am, my roles, my shop and my settings',
  reply: Me,
});

export const updateMe = operation({
  id: 'updateMe',
  method: 'patch',
  path: '/me',
  area: 'You',
  summary: 'Change my name, my units or whether single keys act as shortcuts',
  body: UpdateMe,
  reply: Me,
});

export const changePassword = operation({
  id: 'changePassword',
  method: 'post',
  path: '/me/password',
  area: 'You',
  summary: 'Change my password; every other session ends',
  body: ChangePassword,
});

export const signOutEverywhere = operation({
  id: 'signOutEverywhere',
  method: 'post',
  path: '/me/sign-out-everywhere',
  area: 'You',
  summary: 'End all my sessions, this one too',
});
