import { useQuery } from "@tanstack/react-query";
import { FILE_BYTES, type FileAnswer, type FilePurpose, type ProblemBody } from "@/lib/api";
import { ApiProblem, request } from "./api";
import { useChange } from "./queries";

/** Where files are kept: at a job, or at an entry of the library. */
export type FilePlace = { jobId: string } | { entryId: string };

const at = encodeURIComponent;
const placePath = (place: FilePlace) => ("jobId" in place ? `/api/jobs/${at(place.jobId)}/files` : `/api/library/${at(place.entryId)}/files`);
export const filesKey = (place: FilePlace) => ["files", "jobId" in place ? place.jobId : place.entryId] as const;

/** Address of a file; `width` asks for a smaller copy of a picture. */
export const fileUrl = (id: string, options: { inline?: boolean; width?: 320 | 1280 } = {}): string => {
  const query = [options.inline ? "inline" : "", options.width ? `width=${options.width}` : ""].filter(Boolean).join("&");
  return `/api/files/${at(id)}${query ? `?${query}` : ""}`;
};

export const useFiles = (place: FilePlace, enabled = true) =>
  useQuery({ queryKey: filesKey(place), queryFn: () => request<{ files: FileAnswer[] }>("GET", placePath(place)), enabled });

export const useRemoveFile = (place: FilePlace) =>
  useChange((id: string) => request<undefined>("DELETE", `/api/files/${at(id)}`), [filesKey(place)]);

const problem = (status: number, code: string, detail: string, requestId = ""): ApiProblem =>
  new ApiProblem({ type: "about:blank", title: detail, status, code, detail, requestId });

/** What can be seen without sending: the server would say the same. Null when nothing is wrong. */
export function unsendable(file: Blob): ApiProblem | null {
  if (file.size === 0) return problem(422, "file-empty", "The file is empty (0 bytes).");
  if (file.size > FILE_BYTES) return problem(413, "file-too-large", `The file is larger than ${Math.round(FILE_BYTES / 1024 / 1024)} MB, the most that is taken.`);
  return null;
}

export interface Upload {
  place: FilePlace; file: File; purpose: FilePurpose;
  /** Part that was sent, 0 to 1; at 1 the server is looking at the file. */
  onProgress?: (sent: number) => void;
  signal?: AbortSignal;
}

/**
 * Sends a file. XMLHttpRequest, since fetch does not tell how much was sent.
 * @throws ApiProblem for every refusal, code "offline" without a connection and "stopped" after `signal`
 */
export function uploadFile({ place, file, purpose, onProgress, signal }: Upload): Promise<FileAnswer> {
  const wrong = unsendable(file);
  if (wrong) return Promise.reject(wrong);
  return new Promise((resolve, reject) => {
    const sending = new XMLHttpRequest();
    sending.open("POST", `${placePath(place)}?name=${at(file.name.slice(-300) || "file")}&purpose=${at(purpose)}`);
    sending.setRequestHeader("content-type", "application/octet-stream");
    sending.upload.onprogress = (event) => event.lengthComputable && onProgress?.(event.loaded / event.total);
    sending.onload = () => {
      const answer = answerOf(sending.responseText);
      if (sending.status === 201 && answer) resolve(answer as unknown as FileAnswer);
      else if (answer && "detail" in answer) reject(new ApiProblem(answer as unknown as ProblemBody));
      else reject(problem(sending.status, "no-answer", "The server gave no usable answer.", sending.getResponseHeader("x-request-id") ?? ""));
    };
    sending.onerror = () => reject(problem(0, "offline", "The connection was lost while sending. The file is still chosen; try again."));
    sending.onabort = () => reject(problem(0, "stopped", "Stopped."));
    signal?.addEventListener("abort", () => sending.abort(), { once: true });
    sending.send(file);
  });
}

function answerOf(text: string): Record<string, unknown> | null {
  try {
    const value: unknown = JSON.parse(text);
    return typeof value === "object" && value !== null ? (value as Record<string, unknown>) : null;
  } catch {
    return null;
  }
}

/** What a refusal says beside the file's name: "is text, whatever its name says". */
export function uploadRefusal(name: string, error: ApiProblem): string {
  return error.field === "file" && error.fieldMessage !== error.body.detail ? `${name} ${error.fieldMessage}.` : error.message;
}
