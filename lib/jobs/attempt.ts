/** Which try of a job this is. After the last one nobody tries again by itself. */
export type Attempt = { jobId: string; isLast: boolean };
