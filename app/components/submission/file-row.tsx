import { Button } from "@/app/components/ui/button";
import { Select } from "@/app/components/ui/select";
import { StateMark } from "@/app/components/ui/state-mark";
import { TextInput } from "@/app/components/ui/text-input";
import { formatBytes } from "@/app/components/ui/figures";
import type { Refusal } from "@/benchmarks/scoring/data-error";
import type { Finding } from "@/benchmarks/scoring/result";
import { runRoles } from "@/drizzle/enums";
import { RefusalNote } from "./refusal-note";
import { roleNames } from "./role-names";
import type { RowsAction, UploadRow } from "./upload-rows";
import type { Checked } from "./use-file-checks";

interface FileRowProps {
  row: UploadRow;
  answer: Checked | undefined;
  refusals: Refusal[];
  findings: Finding[];
  share: number | null;
  isSending: boolean;
  onChange: (action: RowsAction) => void;
}

/** On a phone each cell is a line with its column's name. */
const cell =
  "max-md:flex max-md:items-center max-md:justify-between max-md:gap-3.5 max-md:border-0 max-md:p-0.5 " +
  "max-md:before:text-13 max-md:before:text-ink-2 max-md:before:content-[attr(data-label)]";

export function FileRow(props: FileRowProps) {
  const { row, answer, refusals, findings, share, isSending, onChange } = props;
  const read = answer && answer !== "fault" ? answer : null;
  const shown = [...(read?.refusal ? [read.refusal] : []), ...refusals];
  const hasNotes = shown.length > 0 || findings.length > 0;
  const change = (field: "n" | "role" | "wall") => (event: { target: { value: string } }) =>
    onChange({ type: "change", name: row.name, field, value: event.target.value });
  return (
    <>
      <tr
        className={`max-md:block max-md:py-2 ${hasNotes ? "*:border-b-0" : "max-md:border-b max-md:border-hair-2"}`}
      >
        <th scope="row" className="font-figure break-all max-md:block max-md:border-0">
          {row.name}
        </th>
        <td data-label="N" className={`num ${cell}`}>
          <TextInput
            value={row.n}
            onChange={change("n")}
            disabled={isSending}
            aria-label={`N of ${row.name}`}
            placeholder="N"
            className="w-22 px-2 py-1 text-right font-figure text-13"
          />
        </td>
        <td data-label="Bytes" className={`num ${cell}`}>
          {formatBytes(row.file.size)}
        </td>
        <td className="font-figure text-13 text-ink-2 max-lg:hidden">{read?.sha256?.slice(0, 12) ?? ""}</td>
        <td data-label="Role" className={cell}>
          <Select
            value={row.role}
            onChange={change("role")}
            disabled={isSending}
            aria-label={`Role of ${row.name}`}
            className="w-auto py-1 text-13"
          >
            {runRoles.map((role) => (
              <option key={role} value={role}>
                {roleNames[role]}
              </option>
            ))}
          </Select>
        </td>
        <td data-label="State" className={cell}>
          <FileState
            answer={answer}
            refused={shown.length > 0}
            findings={findings.length}
            share={share}
            name={row.name}
          />
        </td>
        <td data-label="Wall time, declared" className={`num ${cell}`}>
          <TextInput
            value={row.wall}
            onChange={change("wall")}
            disabled={isSending}
            aria-label={`Wall time of ${row.name}`}
            placeholder="0.4 ms"
            className="w-22 px-2 py-1 text-right font-figure text-13"
          />
        </td>
        <td className={`num ${cell}`}>
          <Button
            type="button"
            variant="text"
            disabled={isSending}
            onClick={() => onChange({ type: "remove", name: row.name })}
          >
            Remove<span className="sr-only"> {row.name}</span>
          </Button>
        </td>
      </tr>
      {hasNotes ? (
        <tr className="max-md:block max-md:border-b max-md:border-hair-2 max-md:pb-3">
          <td colSpan={8} className="pt-0 pb-3.5 max-md:block">
            <div className="grid gap-2.5">
              {shown.map((refusal) => (
                <RefusalNote
                  key={refusal.code + refusal.message}
                  refusal={refusal}
                  excerpt={refusal === read?.refusal ? read.excerpt : null}
                  remedy={
                    refusal === read?.refusal
                      ? "Drop a file of the same name to replace this one; the others are kept."
                      : undefined
                  }
                />
              ))}
              {findings.map((finding) => (
                <p key={finding.code + finding.message} className="border-l-3 border-warn pl-3 text-14">
                  {finding.message}
                </p>
              ))}
            </div>
          </td>
        </tr>
      ) : null}
    </>
  );
}

interface FileStateProps {
  answer: Checked | undefined;
  refused: boolean;
  findings: number;
  share: number | null;
  name: string;
}

function FileState({ answer, refused, findings, share, name }: FileStateProps) {
  if (share !== null) return <Uploading share={share} name={name} />;
  if (refused) return <StateMark state="refused">refused</StateMark>;
  if (answer === "fault") return <StateMark state="none">not checked here</StateMark>;
  if (!answer) return <StateMark state="running">reading</StateMark>;
  if (findings > 0)
    return <StateMark state="finding">{`read, ${findings} finding${findings === 1 ? "" : "s"}`}</StateMark>;
  return <StateMark state="ok">read</StateMark>;
}

function Uploading({ share, name }: { share: number; name: string }) {
  const percent = Math.floor(100 * share);
  if (percent === 100) return <StateMark state="ok">sent</StateMark>;
  return (
    <span className="inline-flex items-center gap-2.5">
      <progress value={percent} max={100} aria-label={`Uploading ${name}`} className="sr-only" />
      <span aria-hidden="true" className="inline-block h-[9px] w-16 border border-ink">
        <span className="block h-full bg-ink" style={{ width: `${percent}%` }} />
      </span>
      <StateMark state="running">{share === 0 ? "waits" : `uploading ${percent} %`}</StateMark>
    </span>
  );
}
