import type { ImportReport } from "@/lib/records/imports/fault";

export type Answer = { report: ImportReport } | { refusal: string };

/**
 * Sends a file to be checked or imported.
 * @param onSent Told of the share that has been sent, 0 to 1, while it goes; fetch cannot tell that.
 */
export function sendFile(options: URLSearchParams, file: Blob, onSent: (share: number) => void): Promise<Answer> {
  return new Promise((resolve) => {
    const request = new XMLHttpRequest();
    request.open("POST", `/api/portal/imports?${options}`);
    request.setRequestHeader("Content-Type", "text/csv");
    request.responseType = "json";
    request.upload.onprogress = ({ loaded, total }) => onSent(total > 0 ? loaded / total : 1);
    request.onload = () => {
      const content = request.response as (ImportReport & { detail?: string }) | null;
      resolve(request.status === 200 && content ? { report: content } : { refusal: content?.detail ?? "It could not be read. Try again." });
    };
    request.onerror = () => resolve({ refusal: "The connection broke off. Check it and send the file again; what was made already is not made twice." });
    request.send(file);
  });
}
