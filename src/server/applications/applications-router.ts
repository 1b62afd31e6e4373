import {
  AdmissionDecision,
  AdmissionOutcome,
  ApplicantDetail,
  ApplicantParams,
  ApplicantsPage,
  ApplicantsQuery,
  ApplicationDesk,
  ApplicationForm,
  ApplicationParams,
  IMPORT_MAX_BYTES,
  ImportPreview,
  ImportRequest,
  ImportResult,
  ListedMentors,
  OwnApplication,
  OwnApplications,
  SideParams,
} from '../../../shared/applications/applications-contract';
import { CycleParams } from '../../../shared/cycles/cycles-contract';
import { Problem, route, type Route } from '../platform';
import { decideAdmission } from './decide-admission';
import { exportApplicants } from './export-applicants';
import { importApplicants, previewImport } from './import-applicants';
import { showApplicant, showApplicants } from './show-applicants';
import { showDesk, showListedMentors, showOwnApplications } from './show-own';
import { applyForSelf } from './submit-application';
import { withdrawApplication } from './withdraw-application';

// base64 takes four bytes for three, and the request has a name and a mapping beside the file.
const IMPORT_BODY = Math.ceil((IMPORT_MAX_BYTES * 4) / 3) + 100_000;

export const applicationsRoutes: Route[] = [
  route({
    method: 'get',
    path: '/api/applications/mine',
    may: ['member'],
    summary: 'One’s own applications, newest cycle first',
    answer: OwnApplications,
    handle: (ctx) => showOwnApplications(ctx),
  }),
  route({
    method: 'get',
    path: '/api/applications/cycles/:cycleId/mine',
    may: ['member'],
    summary: 'What one needs to apply to a cycle, and what one has sent already',
    params: CycleParams,
    answer: ApplicationDesk,
    handle: (ctx, { params }) => showDesk(ctx, params.cycleId),
  }),
  route({
    method: 'put',
    path: '/api/applications/cycles/:cycleId/:side',
    may: ['member'],
    summary: 'Apply to a cycle on one side (version 0), or change what one sent',
    versioned: true,
    params: SideParams,
    body: ApplicationForm,
    answer: OwnApplication,
    handle: (ctx, { params, body, version }) => {
      if (body.side !== params.side) throw new Problem('invalid', 'The address and the form name different sides');
      return applyForSelf(ctx, params.cycleId, body, version);
    },
  }),
  route({
    method: 'post',
    path: '/api/applications/:applicationId/withdraw',
    may: ['member'],
    summary: 'Take back one’s own application',
    params: ApplicationParams,
    answer: OwnApplication,
    handle: (ctx, { params }) => withdrawApplication(ctx, params.applicationId),
  }),
  route({
    method: 'get',
    path: '/api/applications/cycles/:cycleId/listed-mentors',
    may: ['member'],
    summary: 'Mentors of a cycle who agreed to be listed',
    params: CycleParams,
    answer: ListedMentors,
    handle: (ctx, { params }) => showListedMentors(ctx, params.cycleId),
  }),
  route({
    method: 'get',
    path: '/api/applications/cycles/:cycleId/applicants',
    may: ['coordinator'],
    summary: 'The applicants of a cycle, page by page',
    params: CycleParams,
    query: ApplicantsQuery,
    answer: ApplicantsPage,
    handle: (ctx, { params, query }) => showApplicants(ctx, params.cycleId, query),
  }),
  route({
    method: 'get',
    path: '/api/applications/cycles/:cycleId/applicants.csv',
    may: ['coordinator'],
    summary: 'The applicants of a filter as a CSV file',
    params: CycleParams,
    query: ApplicantsQuery,
    handle: (ctx, { params, query }) => exportApplicants(ctx, params.cycleId, query),
  }),
  route({
    method: 'get',
    path: '/api/applications/cycles/:cycleId/applicants/:applicationId',
    may: ['coordinator'],
    summary: 'A whole application with the private part of its profile',
    params: ApplicantParams,
    answer: ApplicantDetail,
    handle: (ctx, { params }) => showApplicant(ctx, params.cycleId, params.applicationId),
  }),
  route({
    method: 'post',
    path: '/api/applications/cycles/:cycleId/decisions',
    may: ['coordinator'],
    summary: 'Admit, put on the waiting list or withdraw many applications',
    params: CycleParams,
    body: AdmissionDecision,
    bodyLimit: 400_000,
    answer: AdmissionOutcome,
    handle: (ctx, { params, body }) => decideAdmission(ctx, params.cycleId, body),
  }),
  route({
    method: 'post',
    path: '/api/applications/cycles/:cycleId/import/preview',
    may: ['coordinator'],
    summary: 'What importing a list would do',
    params: CycleParams,
    body: ImportRequest,
    bodyLimit: IMPORT_BODY,
    answer: ImportPreview,
    handle: (ctx, { params, body }) => previewImport(ctx, params.cycleId, body),
  }),
  route({
    method: 'post',
    path: '/api/applications/cycles/:cycleId/import',
    may: ['coordinator'],
    summary: 'Import a list as a whole or not at all',
    params: CycleParams,
    body: ImportRequest,
    bodyLimit: IMPORT_BODY,
    answer: ImportResult,
    status: 201,
    handle: (ctx, { params, body }) => importApplicants(ctx, params.cycleId, body),
  }),
];
