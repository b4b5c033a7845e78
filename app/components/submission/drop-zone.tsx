import { type DragEvent, useRef, useState } from "react";
import { Button } from "@/app/components/ui/button";
import type { Limits } from "./submit-readiness";

interface DropZoneProps {
  limits: Limits;
  isDisabled: boolean;
  onFiles: (files: File[]) => void;
}

/** Drawing paper, as the domain drawings stand on. */
const ground = {
  background:
    "linear-gradient(var(--grid-minor) 1px, transparent 1px) 0 0 / 100% 14px, " +
    "linear-gradient(90deg, var(--grid-minor) 1px, transparent 1px) 0 0 / 14px 100%, var(--sheet)",
};

/** Takes files by drag and drop or from the chooser. A folder is not opened. */
export function DropZone({ limits, isDisabled, onFiles }: DropZoneProps) {
  const [isOver, setIsOver] = useState(false);
  const chooser = useRef<HTMLInputElement>(null);
  const mebibytes = (bytes: number) => bytes / 2 ** 20;

  const drop = (event: DragEvent) => {
    event.preventDefault();
    setIsOver(false);
    if (!isDisabled) onFiles(filesOf(event.dataTransfer));
  };
  return (
    <div
      style={ground}
      className={`flex items-center gap-6 border px-6 py-5 max-md:flex-col max-md:items-start max-md:gap-3 max-md:p-4.5 ${isOver ? "border-solid border-ink" : "border-dashed border-ink-2"}`}
      onDragOver={(event) => {
        event.preventDefault();
        setIsOver(true);
      }}
      onDragLeave={() => setIsOver(false)}
      onDrop={drop}
    >
      <FilesDrawing />
      <div>
        <p className="font-display text-20 font-medium">Drop the files here</p>
        <p className="text-13 text-ink-2">
          NPY, NPZ, CSV or TSV. Up to {mebibytes(limits.fileBytes)} MiB a file, {limits.files} files,{" "}
          {mebibytes(limits.totalBytes)} MiB in all. A file of the same name replaces the one before.
        </p>
      </div>
      <div className="ml-auto shrink-0 max-md:ml-0">
        <Button type="button" disabled={isDisabled} onClick={() => chooser.current?.click()}>
          Choose files
        </Button>
        <input
          ref={chooser}
          type="file"
          multiple
          hidden
          aria-label="Files"
          onChange={(event) => {
            onFiles([...(event.target.files ?? [])]);
            // The same file may be chosen again after it was mended.
            event.target.value = "";
          }}
        />
      </div>
    </div>
  );
}

function filesOf(transfer: DataTransfer): File[] {
  return [...transfer.items].flatMap((item) => {
    if (item.kind !== "file" || item.webkitGetAsEntry()?.isDirectory) return [];
    return item.getAsFile() ?? [];
  });
}

function FilesDrawing() {
  return (
    <svg width="54" height="46" viewBox="0 0 54 46" aria-hidden="true" className="shrink-0">
      <g fill="var(--sheet)" stroke="var(--ink)" strokeWidth="1.3">
        <path d="M16 2H38L46 10V36H16Z" />
        <path d="M10 7H32L40 15V41H10Z" />
        <path d="M4 12H26L34 20V45H4Z" />
        <path d="M26 12V20H34" fill="none" />
      </g>
      <path d="M9 26C16 26 17 39 29 39" stroke="var(--ink)" strokeWidth="1.5" fill="none" />
    </svg>
  );
}
