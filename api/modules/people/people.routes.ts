import {
  acceptInvitationInputSchema,
  sessionSchema,
  signInInputSchema,
} from '../../../shared/contracts/people.ts';
import { defineEmptyEndpoint, defineEndpoint } from '../../endpoint.ts';
import { sessionCookie } from '../../middleware/session.ts';
import { acceptInvitation } from './accept-invitation.ts';
import { authenticate } from './authenticate.ts';
import { beginSession, endSession } from './browser-session.ts';
import { presentPerson } from './person.presenter.ts';

export const peopleEndpoints = [
  defineEndpoint({
    method: 'post',
    path: '/api/session',
    summary: 'Signs in: answers with who it is and sets the session cookie.',
    access: 'anybody',
    limit: 'sign-in',
    body: signInInputSchema,
    response: sessionSchema,
    handler: async ({ em, request, response }) => {
      const person = await authenticate(em, request, response);
      await beginSession(request, person.id);
      return { person: presentPerson(person) };
    },
  }),
  defineEndpoint({
    method: 'get',
    path: '/api/session',
    summary: 'Tells who is signed in.',
    access: 'anybody',
    response: sessionSchema,
    handler: ({ actor }) => Promise.resolve({ person: actor }),
  }),
  defineEmptyEndpoint({
    method: 'delete',
    path: '/api/session',
    summary: 'Signs out.',
    access: 'anybody',
    handler: async ({ request, response }) => {
      await endSession(request);
      response.clearCookie(sessionCookie);
    },
  }),
  defineEndpoint({
    method: 'post',
    path: '/api/invitations/accept',
    summary: 'Makes an account by a one-time link and signs in.',
    access: 'anybody',
    limit: 'sign-in',
    body: acceptInvitationInputSchema,
    status: 201,
    response: sessionSchema,
    handler: async ({ em, body, request }) => {
      const person = await acceptInvitation(em, body, new Date());
      await beginSession(request, person.id);
      return { person: presentPerson(person) };
    },
  }),
];
