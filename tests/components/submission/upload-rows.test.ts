import { describe, expect, it } from "vitest";
import { changeRows, type UploadRow } from "@/app/components/submission/upload-rows";
import { shareSent } from "@/app/components/submission/send-submission";

const file = (name: string, text = name) => new File([text], name);
const add = (rows: UploadRow[], ...files: File[]) => changeRows(rows, { type: "add", files });
const names = (rows: UploadRow[]) => rows.map((row) => row.name);

describe("the chosen files", () => {
  it("stand in the order of the numbers in their names", () => {
    expect(names(add([], file("n128.npy"), file("n16.npy"), file("n64.npy")))).toEqual([
      "n16.npy",
      "n64.npy",
      "n128.npy",
    ]);
  });

  it("are replaced by name, and what was declared about them is kept", () => {
    const first = changeRows(add([], file("n16.npy")), {
      type: "change",
      name: "n16.npy",
      field: "wall",
      value: "2 s",
    });
    const [row, ...others] = add(first, file("n16.npy", "mended"));
    expect(others).toEqual([]);
    expect(row).toMatchObject({ wall: "2 s", generation: 2 });
    expect(row.file.size).toBe("mended".length);
  });

  it("propose n until it is typed", () => {
    const propose = (rows: UploadRow[], n: string) => changeRows(rows, { type: "propose", name: "a", n });
    const proposed = propose(add([], file("a")), "64");
    expect(proposed[0].n).toBe("64");
    const typed = changeRows(proposed, { type: "change", name: "a", field: "n", value: "63" });
    expect(propose(typed, "64")[0].n).toBe("63");
  });

  it("are named as the server names them, composed", () => {
    expect(names(add([], file("feld-u\u0308.npy")))).toEqual(["feld-ü.npy"]);
  });
});

describe("the progress of an upload", () => {
  it("fills the files in the order in which they are sent", () => {
    expect(shareSent([100, 100, 50], 150)).toEqual([1, 0.5, 0]);
    expect(shareSent([100, 100, 50], 260)).toEqual([1, 1, 1]);
  });
});
