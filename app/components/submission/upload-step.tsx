import { Button } from "@/app/components/ui/button";
import { Field } from "@/app/components/ui/field";
import { Notice } from "@/app/components/ui/notice";
import { Select } from "@/app/components/ui/select";
import { dataLicences } from "@/drizzle/enums";
import type { FieldBinding } from "./field-binding";
import { Step } from "./step";

interface UploadStepProps extends FieldBinding {
  files: number;
  /** What is left to do; empty once the files can be sent. */
  reasons: string[];
  /** Without a script nothing is known of the files, and the button is never disabled. */
  isScripted: boolean;
  /** Share of all bytes that has gone out; null while nothing is being sent. */
  progress: number | null;
  /** What the server said of the last attempt; null where it said nothing. */
  message: string | null;
  onCancel: () => void;
}

export function UploadStep(props: UploadStepProps) {
  const { bind, errorOf, files, reasons, isScripted, progress, message, onCancel } = props;
  const isWaiting = isScripted && reasons.length > 0;
  return (
    <Step id="upload" title="Upload" remark="private until it is listed">
      <div className="grid gap-x-7 sm:grid-cols-2 lg:grid-cols-3">
        <Field label="Data licence" error={errorOf("dataLicence")} hint="Travels with every download.">
          <Select {...bind("dataLicence")}>
            {dataLicences.map((licence) => (
              <option key={licence} value={licence}>
                {licence}
              </option>
            ))}
          </Select>
        </Field>
      </div>
      <div aria-live="polite">{message ? <Notice tone="bad">{message}</Notice> : null}</div>
      <div className="flex items-center gap-6 max-md:flex-col max-md:items-start max-md:gap-3.5">
        {progress === null ? (
          <Button type="submit" variant="primary" disabled={isWaiting} aria-describedby="send-remark">
            {isScripted && files > 0
              ? `Upload ${files} file${files === 1 ? "" : "s"} and score`
              : "Upload and score"}
          </Button>
        ) : (
          <Button type="button" onClick={onCancel}>
            Cancel the upload
          </Button>
        )}
        <p id="send-remark" className="text-13 text-ink-2">
          {progress === null ? remarkOf(isWaiting ? reasons : []) : sendingRemark(progress)}
        </p>
      </div>
    </Step>
  );
}

function remarkOf(reasons: string[]): string {
  if (reasons.length === 0) {
    return "The server scores the files and shows you the result; you hand it in for review afterwards.";
  }
  return `Before they can be sent: ${reasons.join("; ")}.`;
}

function sendingRemark(progress: number): string {
  return progress < 1
    ? `${Math.floor(100 * progress)} % sent. Keep this page open.`
    : "All bytes are sent; the server is storing them.";
}
