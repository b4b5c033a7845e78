const mebibyte = 1024 * 1024;

export interface UploadLimits {
  fileBytes: number;
  files: number;
  totalBytes: number;
  /** Of the `submission` part and any other field of a form. */
  fieldBytes: number;
}

export const uploadLimits: UploadLimits = {
  fileBytes: 64 * mebibyte,
  files: 24,
  totalBytes: 256 * mebibyte,
  fieldBytes: mebibyte,
};

export function mebibytes(bytes: number): string {
  return `${Number((bytes / mebibyte).toFixed(1))} MiB`;
}
