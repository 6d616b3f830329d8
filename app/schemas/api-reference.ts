/** One field of what is sent or answered. */
export interface ApiField {
  /** where it stands, such as films[].thickness_m */
  name: string;
  type: string;
  required: boolean;
  /** what it is; '' where its name says it */
  about: string;
}

/** One operation as its page shows it. */
export interface ApiOperationView {
  id: string;
  method: string;
  path: string;
  summary: string;
  scope: string;
  query: ApiField[];
  body: ApiField[];
  bodyType: string | null;
  answer: ApiField[];
  status: number;
  statuses: number[];
}

export interface ApiReference {
  groups: { name: string; operations: ApiOperationView[] }[];
}
