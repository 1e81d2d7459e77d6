/** Addresses of the pages, in one place. */
export const paths = {
  jobs: "/jobs",
  newJob: "/jobs/new",
  job: (jobId: string) => `/jobs/${jobId}`,
  drawing: (jobId: string) => `/jobs/${jobId}/drawing`,
  visit: (jobId: string) => `/jobs/${jobId}/visit`,
  sheets: (jobId: string) => `/jobs/${jobId}/sheets`,
  revision: (jobId: string, revisionId: string) => `/jobs/${jobId}/review/${revisionId}`,
  jurisdictions: "/jurisdictions",
  library: "/library",
  libraryEntry: (id: string) => `/library/${id}`,
  newEntry: (kind?: string) => `/library/new${kind ? `?kind=${kind}` : ""}`,
  importEntries: (kind?: string) => `/library/import${kind ? `?kind=${kind}` : ""}`,
  jurisdiction: (id: string) => `/jurisdictions/${id}`,
  counter: (jobId: string) => `/counter/${jobId}`,
};
