import { ApiProblem, NetworkProblem } from "@/lib/ui";

export type SentFile = { importId: number; code: string };

type Progress = (sent: number, total: number) => void;

function problemOf(status: number, text: string): ApiProblem {
  try {
    const document = JSON.parse(text) as ConstructorParameters<typeof ApiProblem>[0];
    if (typeof document.type === "string") return new ApiProblem(document);
  } catch {
    // What is no problem document gets the sentence below.
  }
  return new ApiProblem({
    type: "about:blank",
    title: "The file was not taken",
    status,
    detail: `The server refused the file (${status}) without saying why. Try again.`,
  });
}

/**
 * Sends a file as it is and tells how much has gone. (fetch does not tell; this does.)
 * @throws ApiProblem when the server refuses, NetworkProblem when it is not reached
 */
export function sendFile(file: File, key: string, onProgress: Progress): Promise<SentFile> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    request.open("POST", `/api/v1/imports?name=${encodeURIComponent(file.name)}`);
    request.setRequestHeader("Content-Type", "application/octet-stream");
    request.setRequestHeader("Idempotency-Key", key);
    request.upload.onprogress = (event) => onProgress(event.loaded, file.size);
    request.onerror = () => reject(new NetworkProblem(new Error("the file could not be sent")));
    request.onload = () => {
      if (request.status === 201) resolve((JSON.parse(request.responseText) as { data: SentFile }).data);
      else reject(problemOf(request.status, request.responseText));
    };
    request.send(file);
  });
}
