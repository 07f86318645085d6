export { type ApiClient, type ApiClientOptions, createApiClient } from './client';
export type { components, paths } from './generated/api';
export { type FieldProblem, type ProblemBody, ProblemError, problemFromResponse, UNREACHABLE } from './problem';
