/** Every route of the server: it validates with this table, the client calls with it, and the OpenAPI document is made from it. */
import { z } from 'zod';

import { changePasswordBody, ownSessionsSchema, sessionParams } from './account';
import { defineRoute } from './defineRoute';
import { entriesQuery, entriesSchema, postedEntriesSchema, postEntriesBody } from './entries';
import { handOverBody, takeOverBody } from './handOver';
import { fileParams, fileQuery, fileSizeQuery, keptFileSchema } from './files';
import { answeredHoldSchema, answerHoldBody, holdsSchema, secondPersonBody } from './holds';
import { machineIdSchema, runIdSchema, treeIdSchema, versionSchema } from './ids';
import { instrumentsSchema } from './instruments';
import { dossierSchema, machinesSchema } from './machines';
import { peopleSchema } from './people';
import { acceptBody, findingBody, jwksSchema, recordSchema, recordsQuery, recordsSchema, replyBody, returnBody, reviewedSchema, signedRecordSchema, submitBody } from './records';
import { runBundleSchema, runsQuery, runsSchema, startRunBody } from './runs';
import { meSchema, signInBody } from './session';
import { workshopSettingsSchema } from './settings';
import { closeStrandedBody } from './strandedRun';
import { treeDocumentSchema, treesSchema } from './trees';

const done = z.object({ done: z.literal(true) });
const health = z.object({ ok: z.literal(true) });
const runParams = z.strictObject({ run: runIdSchema });
const recordParams = z.strictObject({ record: runIdSchema });
const treeParams = z.strictObject({ tree: treeIdSchema, version: z.coerce.number<unknown>().pipe(versionSchema) });

export const routes = {
  signIn: defineRoute({ method: 'post', path: '/api/session', summary: 'Sign in', who: 'anyone', body: signInBody, status: 201, answer: meSchema, problems: ['sign-in-failed', 'too-many'] }),
  refreshSession: defineRoute({ method: 'post', path: '/api/session/refresh', summary: 'Renew the session with its refresh cookie', who: 'anyone', status: 200, answer: meSchema, problems: ['signed-out', 'session-expired'] }),
  signOut: defineRoute({ method: 'delete', path: '/api/session', summary: 'Sign out', who: 'anyone', status: 200, answer: done, problems: [] }),
  me: defineRoute({ method: 'get', path: '/api/me', summary: 'Who is signed in', who: 'member', status: 200, answer: meSchema, problems: [] }),

  sessions: defineRoute({ method: 'get', path: '/api/sessions', summary: 'Own sessions of this workshop', who: 'member', status: 200, answer: ownSessionsSchema, problems: [] }),
  endSession: defineRoute({ method: 'delete', path: '/api/sessions/:session', summary: 'End one of the own sessions', who: 'member', params: sessionParams, status: 200, answer: done, problems: ['not-found'] }),
  changePassword: defineRoute({ method: 'post', path: '/api/password', summary: 'Change the own password; every other session ends', who: 'member', body: changePasswordBody, status: 201, answer: done, problems: ['wrong-password', 'weak-password', 'too-many'] }),

  machines: defineRoute({ method: 'get', path: '/api/machines', summary: 'Machines of the workshop', who: 'member', status: 200, answer: machinesSchema, problems: [] }),
  machine: defineRoute({ method: 'get', path: '/api/machines/:machine', summary: 'One machine with its profile, runs, releases and what stays fitted', who: 'member', params: z.strictObject({ machine: machineIdSchema }), status: 200, answer: dossierSchema, problems: ['not-found'] }),
  trees: defineRoute({ method: 'get', path: '/api/trees', summary: 'Fault trees and their versions', who: 'member', status: 200, answer: treesSchema, problems: [] }),
  treeVersion: defineRoute({ method: 'get', path: '/api/trees/:tree/versions/:version', summary: 'One version with the trees that it calls', who: 'member', params: treeParams, status: 200, answer: treeDocumentSchema, problems: ['not-found'] }),
  instruments: defineRoute({ method: 'get', path: '/api/instruments', summary: 'Instruments of the workshop', who: 'member', status: 200, answer: instrumentsSchema, problems: [] }),
  people: defineRoute({ method: 'get', path: '/api/people', summary: 'Members of the workshop', who: 'member', status: 200, answer: peopleSchema, problems: [] }),
  settings: defineRoute({ method: 'get', path: '/api/settings', summary: 'Settings of the workshop', who: 'member', status: 200, answer: workshopSettingsSchema, problems: [] }),

  addFile: defineRoute({ method: 'post', path: '/api/files', summary: 'Keep a photo or a paper (multipart form, field “file”); sending one twice is answered as the first time', who: 'member', query: fileQuery, upload: true, status: 201, answer: keptFileSchema, problems: ['not-found', 'not-your-run', 'wrong-state', 'role-missing', 'bad-file', 'too-large', 'bad-input'] }),
  file: defineRoute({ method: 'get', path: '/api/files/:hash', summary: 'A photo or a paper, to those who may see it; takes a range', who: 'member', params: fileParams, query: fileSizeQuery, media: ['image/jpeg', 'application/pdf'], status: 200, answer: z.object({}), problems: ['not-found', 'bad-range'] }),

  runs: defineRoute({ method: 'get', path: '/api/runs', summary: 'Runs, newest first', who: 'member', query: runsQuery, status: 200, answer: runsSchema, problems: [] }),
  startRun: defineRoute({ method: 'post', path: '/api/runs', summary: 'Start a run', who: ['restorer', 'senior'], body: startRunBody, status: 201, answer: runBundleSchema, problems: ['not-found', 'machine-busy', 'id-taken', 'not-startable'] }),
  run: defineRoute({ method: 'get', path: '/api/runs/:run', summary: 'All that a device needs to go on with a run', who: 'member', params: runParams, status: 200, answer: runBundleSchema, problems: ['not-found'] }),
  entries: defineRoute({ method: 'get', path: '/api/runs/:run/entries', summary: 'Entries after a place', who: 'member', params: runParams, query: entriesQuery, status: 200, answer: entriesSchema, problems: ['not-found'] }),
  postEntries: defineRoute({ method: 'post', path: '/api/runs/:run/entries', summary: 'Add entries, in order; sending one twice is answered as the first time', who: ['restorer', 'senior'], params: runParams, body: postEntriesBody, status: 200, answer: postedEntriesSchema, problems: ['not-found', 'not-your-run', 'out-of-sequence', 'id-taken', 'wrong-state', 'refused', 'instrument', 'handed-over', 'other-engine', 'photo-missing'] }),

  holds: defineRoute({ method: 'get', path: '/api/holds', summary: 'Hold points that await a countersign', who: ['senior'], status: 200, answer: holdsSchema, problems: [] }),
  answerHold: defineRoute({ method: 'post', path: '/api/runs/:run/holds', summary: 'Give or refuse a countersign', who: ['senior'], params: runParams, body: answerHoldBody, status: 201, answer: answeredHoldSchema, problems: ['not-found', 'own-run', 'wrong-password', 'no-hold', 'other-engine', 'out-of-sequence', 'id-taken', 'refused', 'too-many'] }),
  secondPerson: defineRoute({ method: 'post', path: '/api/runs/:run/second-person', summary: 'A second person who is present signs in at the restorer’s device', who: ['restorer', 'senior'], params: runParams, body: secondPersonBody, status: 201, answer: answeredHoldSchema, problems: ['not-found', 'not-your-run', 'handed-over', 'own-run', 'wrong-password', 'wrong-state', 'other-engine', 'out-of-sequence', 'id-taken', 'refused', 'too-many'] }),
  handOver: defineRoute({ method: 'post', path: '/api/runs/:run/hand-over', summary: 'Offer a run to another restorer, signed by the one who gives', who: ['restorer', 'senior'], params: runParams, body: handOverBody, status: 201, answer: answeredHoldSchema, problems: ['not-found', 'not-your-run', 'handed-over', 'wrong-password', 'wrong-state', 'other-engine', 'out-of-sequence', 'id-taken', 'refused', 'too-many'] }),
  takeOver: defineRoute({ method: 'post', path: '/api/runs/:run/take-over', summary: 'Take a run that is offered, signed by the one who takes', who: ['restorer', 'senior'], params: runParams, body: takeOverBody, status: 201, answer: answeredHoldSchema, problems: ['not-found', 'not-offered', 'wrong-password', 'wrong-state', 'other-engine', 'out-of-sequence', 'id-taken', 'refused', 'too-many'] }),
  closeStranded: defineRoute({ method: 'post', path: '/api/runs/:run/close', summary: 'Close a run that was begun under rules which the server no longer runs, with a reason', who: ['senior'], params: runParams, body: closeStrandedBody, status: 201, answer: answeredHoldSchema, problems: ['not-found', 'wrong-password', 'wrong-state', 'out-of-sequence', 'id-taken', 'too-many'] }),

  submit: defineRoute({ method: 'post', path: '/api/runs/:run/submit', summary: 'Submit a closed run for review', who: ['restorer', 'senior'], params: runParams, body: submitBody, status: 201, answer: reviewedSchema, problems: ['not-found', 'not-your-run', 'handed-over', 'wrong-state', 'id-taken'] }),
  records: defineRoute({ method: 'get', path: '/api/records', summary: 'Records; a restorer sees the own ones only', who: 'member', query: recordsQuery, status: 200, answer: recordsSchema, problems: [] }),
  record: defineRoute({ method: 'get', path: '/api/records/:record', summary: 'One record', who: 'member', params: recordParams, status: 200, answer: recordSchema, problems: ['not-found'] }),
  addFinding: defineRoute({ method: 'post', path: '/api/records/:record/findings', summary: 'Remark on one entry', who: ['reviewer'], params: recordParams, body: findingBody, status: 201, answer: reviewedSchema, problems: ['not-found', 'own-run', 'wrong-state', 'id-taken'] }),
  returnRecord: defineRoute({ method: 'post', path: '/api/records/:record/return', summary: 'Send back with questions', who: ['reviewer'], params: recordParams, body: returnBody, status: 201, answer: reviewedSchema, problems: ['not-found', 'own-run', 'wrong-state', 'id-taken'] }),
  reply: defineRoute({ method: 'post', path: '/api/records/:record/reply', summary: 'Answer the questions of a returned record', who: ['restorer', 'senior'], params: recordParams, body: replyBody, status: 201, answer: reviewedSchema, problems: ['not-found', 'not-your-run', 'handed-over', 'wrong-state', 'id-taken'] }),
  accept: defineRoute({ method: 'post', path: '/api/records/:record/accept', summary: 'Accept and sign a record', who: ['reviewer'], params: recordParams, body: acceptBody, status: 201, answer: reviewedSchema, problems: ['not-found', 'own-run', 'countersigned-run', 'wrong-password', 'wrong-state', 'id-taken', 'too-many'] }),
  exportRecord: defineRoute({ method: 'get', path: '/api/records/:record/export', summary: 'A closed record, signed', who: 'member', params: recordParams, status: 200, answer: signedRecordSchema, problems: ['not-found', 'wrong-state'] }),

  jwks: defineRoute({ method: 'get', path: '/.well-known/jwks.json', summary: 'Public keys of signed records', who: 'anyone', status: 200, answer: jwksSchema, problems: [] }),
  openApi: defineRoute({ method: 'get', path: '/api/openapi.json', summary: 'This interface as OpenAPI 3.1', who: 'anyone', status: 200, answer: z.looseObject({ openapi: z.string() }), problems: [] }),
  health: defineRoute({ method: 'get', path: '/healthz', summary: 'The process runs', who: 'anyone', status: 200, answer: health, problems: [] }),
  ready: defineRoute({ method: 'get', path: '/readyz', summary: 'The database answers', who: 'anyone', status: 200, answer: health, problems: ['not-ready'] }),
} as const;

export type RouteName = keyof typeof routes;
export const ROUTE_NAMES = Object.keys(routes) as RouteName[];
