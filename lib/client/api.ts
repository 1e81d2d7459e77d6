import type {
  CounterAnswer, CounterLine, DrawingAnswer, IssueInput, JobAnswer, JobChange, JobInput, JournalEntry, JurisdictionAnswer, LicenseAnswer,
  LicenseInput, MeAnswer, PasswordInput, PersonAnswer, PersonInput, ProblemBody, RevisionAnswer, RevisionLine, RevisionStatus, SaveAnswer, SaveInput, SetupInput,
} from "@/lib/api";
import type { Role } from "@/lib/policy";

/** A refusal by the server, or no answer at all (status 0, code "offline"). */
export class ApiProblem extends Error {
  constructor(readonly body: ProblemBody) {
    super(body.detail);
    this.name = "ApiProblem";
  }
  get status(): number { return this.body.status; }
  get code(): string { return this.body.code; }
  get field(): string | undefined { return this.body.field; }
  /** What is wrong with the field, without its name; the whole sentence where no field is named. */
  get fieldMessage(): string { return this.body.errors?.find((each) => each.field === this.body.field)?.detail ?? this.body.detail; }
  get requestId(): string { return this.body.requestId; }
}

const made = (status: number, code: string, title: string, detail: string, requestId = ""): ApiProblem =>
  new ApiProblem({ type: "about:blank", title, status, code, detail, requestId });

/**
 * Sends a request and gives back what was answered.
 * @throws ApiProblem for every refusal, also when there is no connection
 */
export async function request<Answer>(method: string, path: string, body?: unknown, signal?: AbortSignal): Promise<Answer> {
  const raw = body instanceof Blob;
  let response: Response;
  try {
    response = await fetch(path, {
      method, credentials: "same-origin", cache: "no-store",
      ...(signal ? { signal } : {}),
      ...(body === undefined ? {} : {
        body: raw ? body : JSON.stringify(body), headers: { "content-type": raw ? body.type || "application/octet-stream" : "application/json" },
      }),
    });
  } catch (error) {
    if (signal?.aborted) throw error;
    throw made(0, "offline", "No connection", "The server does not answer. Check the connection and try again.");
  }
  if (response.status === 204) return undefined as Answer;
  const requestId = response.headers.get("x-request-id") ?? "";
  let answer: unknown;
  try {
    answer = await response.json();
  } catch {
    throw made(response.status, "no-answer", "No answer", "The server gave no usable answer.", requestId);
  }
  if (!response.ok) throw new ApiProblem(answer as ProblemBody);
  return answer as Answer;
}

const get = <Answer>(path: string, signal?: AbortSignal) => request<Answer>("GET", path, undefined, signal);
const post = <Answer>(path: string, body: unknown) => request<Answer>("POST", path, body);
const at = encodeURIComponent;

/** Every route of the server, by what it is for. */
export const api = {
  setUp: (input: SetupInput) => post<{ email: string }>("/api/setup", input),
  me: () => get<MeAnswer>("/api/me"),
  changePassword: (input: PasswordInput) => post<undefined>("/api/me/password", input),
  license: () => get<{ license: LicenseAnswer | null }>("/api/me/license"),
  putLicense: (input: LicenseInput) => request<{ license: LicenseAnswer }>("PUT", "/api/me/license", input),
  putSealGraphic: (file: Blob) => request<{ license: LicenseAnswer }>("PUT", "/api/me/license/seal-graphic", file),

  people: (companyId: string) => get<{ people: PersonAnswer[] }>(`/api/companies/${at(companyId)}/people`),
  addPerson: (companyId: string, input: PersonInput) => post<PersonAnswer>(`/api/companies/${at(companyId)}/people`, input),
  changePerson: (companyId: string, id: string, roles: Role[]) => request<PersonAnswer>("PATCH", `/api/companies/${at(companyId)}/people/${at(id)}`, { roles }),
  removePerson: (companyId: string, id: string) => request<undefined>("DELETE", `/api/companies/${at(companyId)}/people/${at(id)}`),

  jurisdictions: () => get<{ jurisdictions: JurisdictionAnswer[] }>("/api/jurisdictions"),
  createJob: (input: JobInput) => post<{ id: string }>("/api/jobs", input),
  job: (jobId: string) => get<JobAnswer>(`/api/jobs/${at(jobId)}`),
  changeJob: (jobId: string, change: JobChange) => request<JobAnswer>("PATCH", `/api/jobs/${at(jobId)}`, change),
  members: (jobId: string) => get<{ members: PersonAnswer[] }>(`/api/jobs/${at(jobId)}/members`),
  addMember: (jobId: string, input: PersonInput) => post<PersonAnswer>(`/api/jobs/${at(jobId)}/members`, input),
  changeMember: (jobId: string, id: string, roles: Role[]) => request<PersonAnswer>("PATCH", `/api/jobs/${at(jobId)}/members/${at(id)}`, { roles }),
  removeMember: (jobId: string, id: string) => request<undefined>("DELETE", `/api/jobs/${at(jobId)}/members/${at(id)}`),

  drawing: (jobId: string, signal?: AbortSignal) => get<DrawingAnswer>(`/api/jobs/${at(jobId)}/drawing`, signal),
  saveDrawing: (drawingId: string, save: SaveInput) => post<SaveAnswer>(`/api/drawings/${at(drawingId)}/patches`, save),
  savesSince: (drawingId: string, since: number) => get<{ sequence: number; entries: JournalEntry[] }>(`/api/drawings/${at(drawingId)}/patches?since=${since}`),

  revisions: (jobId: string) => get<{ revisions: RevisionLine[] }>(`/api/jobs/${at(jobId)}/revisions`),
  issue: (jobId: string, input: IssueInput) => post<{ id: string }>(`/api/jobs/${at(jobId)}/revisions`, input),
  revision: (id: string) => get<RevisionAnswer>(`/api/revisions/${at(id)}`),
  revisionStatus: (id: string) => get<RevisionStatus>(`/api/revisions/${at(id)}/status`),
  returnRevision: (id: string, comment: string) => post<RevisionAnswer>(`/api/revisions/${at(id)}/return`, { comment }),
  acceptFinding: (id: string, findingKey: string, reason: string) => post<RevisionAnswer>(`/api/revisions/${at(id)}/accept`, { findingKey, reason }),
  seal: (id: string, password: string) => post<RevisionStatus>(`/api/revisions/${at(id)}/seal`, { password }),
  sheetsUrl: (id: string, inline = false) => `/api/revisions/${at(id)}/sheets.pdf${inline ? "?inline" : ""}`,

  counter: () => get<{ jobs: CounterLine[] }>("/api/counter"),
  counterJob: (jobId: string) => get<CounterAnswer>(`/api/counter/${at(jobId)}`),
};
