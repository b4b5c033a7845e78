import { describe, expect, test } from "vitest";

import { defaultLimits } from "@/benchmarks/formats/field-file";
import { readFieldFile } from "@/benchmarks/formats/read-field-file";
import { readTableNumber } from "@/benchmarks/formats/table-number";
import { DataError } from "@/benchmarks/scoring/data-error";
import { refusalOf } from "@/tests/support/refusals";

import { makeRandom } from "./make-random";

const encode = (text: string) => new TextEncoder().encode(text);

/** Shapes and values by name, for a table in text. */
function read(text: string, name = "run.csv"): Record<string, { shape: number[]; values: number[] }> {
  const { arrays } = readFieldFile(name, encode(text));
  return Object.fromEntries(
    [...arrays].map(([key, { shape, values }]) => [key, { shape, values: Array.from(values) }]),
  );
}

const line = {
  x: { shape: [3], values: [0, 0.5, 1] },
  u: { shape: [3], values: [1, -2.5, 3] },
};

describe("a table along one axis", () => {
  test.each([
    ["by commas", "x,u\n0,1\n0.5,-2.5\n1,3\n"],
    ["by semicolons", "x;u\n0;1\n0.5;-2.5\n1;3\n"],
    ["by tabs", "x\tu\n0\t1\n0.5\t-2.5\n1\t3\n"],
    ["by semicolons with decimal commas", "x;u\n0;1\n0,5;-2,5\n1;3\n"],
    ["with its columns in another order", "u,x\n1,0\n-2.5,0.5\n3,1\n"],
    ["with comment and blank lines", '# run "7", of\n\nx,u\n0,1\n  # half\n0.5,-2.5\n\n1,3\n\n'],
    ["with a byte order mark", "\ufeffx,u\n0,1\n0.5,-2.5\n1,3\n"],
    ["with CRLF line ends", "x,u\r\n0,1\r\n0.5,-2.5\r\n1,3\r\n"],
    ["with CR line ends", "x,u\r0,1\r0.5,-2.5\r1,3\r"],
    ["with mixed line ends and none at its end", "x,u\r\n0,1\n0.5,-2.5\r1,3"],
    ["with quoted fields", '"x","u"\n"0","1"\n"0.5","-2.5"\n"1","3"\n'],
    ["with blanks around fields", " x , u\n 0 , 1\n 0.5,  -2.5 \n1 ,3\n"],
    ["with rows in no order", "x,u\n1,3\n0,1\n0.5,-2.5\n"],
    ["with Fortran exponents", "x,u\n0.0D+00,1.0D0\n5.0d-1,-0.25D+01\n1.0D+0,.3q1\n"],
  ])("reads %s", (_, text) => {
    expect(read(text)).toEqual(line);
  });

  test("keeps a descending order, so that the scorer can see it", () => {
    expect(read("x,u\n1,3\n0.5,-2.5\n0,1\n").x.values).toEqual([1, 0.5, 0]);
  });

  test("keeps several fields under their names", () => {
    const { u, v } = read("x,u,v\n0,1,4\n1,2,5\n");
    expect([u.values, v.values]).toEqual([
      [1, 2],
      [4, 5],
    ]);
  });

  test("with a single time keeps t as one number and gives it no axis", () => {
    const { t, u } = read("t,x,u\n0.5,0,1\n0.5,1,2\n");
    expect(t).toEqual({ shape: [1], values: [0.5] });
    expect(u.shape).toEqual([2]);
  });

  test("passes NaN and infinities of the field on: the scorer refuses those", () => {
    expect(read("x,u\n0,NaN\n1,-Inf\n2,infinity\n").u.values).toEqual([NaN, -Infinity, Infinity]);
  });
});

describe("a table on a grid", () => {
  const nodes = [0, 1, 2].flatMap((x) => [10, 20].map((y) => ({ x, y, u: 100 * x + y })));

  test("in two dimensions comes out row-major, x first, in whatever order its rows are", () => {
    const random = makeRandom(3);
    for (let round = 0; round < 20; round++) {
      const shuffled = [...nodes].sort(() => random() - 0.5);
      const text = ["y,u,x", ...shuffled.map(({ x, y, u }) => `${y},${u},${x}`)].join("\n");
      expect(read(text)).toEqual({
        x: { shape: [3], values: [0, 1, 2] },
        y: { shape: [2], values: [10, 20] },
        u: { shape: [3, 2], values: [10, 20, 110, 120, 210, 220] },
      });
    }
  });

  test("at several times has the time axis first", () => {
    const rows = [2, 1].flatMap((t) => nodes.map(({ x, y, u }) => `${t};${x};${y};${u + 1000 * t}`));
    const { t, u } = read(["t;x;y;u", ...rows].join("\n"), "run.TSV");
    expect(t.values).toEqual([1, 2]);
    expect(u.shape).toEqual([2, 3, 2]);
    expect(u.values).toEqual([1010, 1020, 1110, 1120, 1210, 1220, 2010, 2020, 2110, 2120, 2210, 2220]);
  });

  test("along one axis at several times has the shape (Nt, Nx)", () => {
    const { u } = read("x,t,u\n0,0,1\n1,0,2\n2,0,3\n0,1,4\n1,1,5\n2,1,6\n");
    expect(u).toEqual({ shape: [2, 3], values: [1, 2, 3, 4, 5, 6] });
  });

  test("takes -0 and 0 for the same coordinate", () => {
    expect(read("x,y,u\n-0,0,1\n0,1,2\n1,0,3\n1,1,4\n").u.values).toEqual([1, 2, 3, 4]);
  });
});

describe("a refusal of a table names row and column", () => {
  test.each([
    [
      "where a field is no number",
      "x,u\n0,1\n1,one\n",
      "format/not-a-number",
      "row 3, column 2 (u)",
      '"one"',
    ],
    ["where a field is empty", "x,u\n0,1\n1,\n", "format/not-a-number", "row 3, column 2 (u)", "empty"],
    ["with hexadecimal", "x,u\n0,0x10\n", "format/not-a-number", "row 2, column 2 (u)", "0x10"],
    ["with stars", "x,u\n0,****\n", "format/not-a-number", "row 2, column 2 (u)", "too narrow"],
    ["with thousands", "x;u\n0;1.234,5\n", "format/not-a-number", "row 2, column 2 (u)", "thousands"],
    ["with an extra column", "x,u\n0,1,2\n", "format/column-count", "row 2, column 3", "decimal points"],
    ["with decimal commas", "x,u\n0,5,1,25\n", "format/column-count", "row 2, column 3", "semicolons"],
    ["with a column too few", "x,u,v\n0,1\n", "format/column-count", "row 2, column 3", "x, u, v"],
    ["tabs and commas", "x\tu\n0,5\t1\n", "format/decimal-comma", "row 2, column 1 (x)", "semicolons"],
    ["quoted commas", 'x,u\n"0,5",1\n', "format/decimal-comma", "row 2, column 1 (x)", "semicolons"],
    [
      "two decimal marks",
      "x;u\n0,5;1\n1;1.5\n",
      "format/decimal-comma",
      "row 3, column 2 (u)",
      "one decimal",
    ],
    ["without a header", "0,1\n1,2\n", "format/bad-header", "row 1, column 1", "header='x,u', comments=''"],
    ["with a commented header", "# x,u\n0,1\n", "format/bad-header", "row 2, column 1", "comments=''"],
    ["separated by blanks", "# x, u\n0 1\n", "format/separator", "row 2", "comments=''"],
    ["with two separators", "x;u,v\n0;1\n", "format/separator", "row 1", "comma and semicolon"],
    ["with a nameless column", ",x,u\n0,0,1\n", "format/bad-header", "row 1, column 1", "index=False"],
    ["with a name twice", "x,u,u\n0,0,1\n", "format/bad-header", "row 1, column 3", '"u"'],
    [
      "with 65 columns",
      `${",u".repeat(65).slice(1)}\n`,
      "format/bad-header",
      "row 1, column 65",
      "at most 64",
    ],
    [
      "with endless digits",
      `x,u\n0,0.${"1".repeat(200)}\n`,
      "format/not-a-number",
      "row 2, column 2 (u)",
      "...",
    ],
    ["with a strange name", "x [m],u\n0,1\n", "format/bad-header", "row 1, column 1", "x [m]"],
    ["without x", "y,u\n0,1\n", "format/no-column", "row 1", "lacks x"],
    ["without a field", "x,y\n0,1\n", "format/no-column", "row 1", "lacks u"],
    ["without rows", "# nothing\nx,u\n", "format/no-rows", "row 3", "without a row of numbers"],
    ["with blanks alone", " \n\n", "format/no-header", "row 1", "no rows"],
    ["with an open quote", 'x,u\n0,"1\n1,2\n', "format/quotes", "row 2", "enclose"],
    ["with a quote within a field", 'x,u\n0,1"\n', "format/quotes", "row 2", "enclose"],
    ["with a row of 10^5 letters", `x,u\n0,${"a".repeat(1e5)}`, "format/long-row", "row 2", "100002"],
    ["with a line end in quotes", 'x,u\n"0\n",1\n', "format/quotes", "row 2", "enclose"],
    ["with a coordinate NaN", "x,u\n0,1\nnan,2\n", "values/not-finite", "row 3, column 1 (x)", "NaN"],
    ["with a node twice", "x,u\n# c\n0,1\n1,2\n0,3\n", "grid/duplicate-node", "row 5", "Rows 3 and 5"],
    ["with times and no t", "x,u\n0,1\n1,2\n0,1\n1,2\n", "grid/duplicate-node", "row 4", "t column"],
    [
      "a node twice, one missing",
      "x,y,u\n0,0,1\n0,1,1\n1,0,1\n1,0,1\n",
      "grid/duplicate-node",
      "row 5",
      "once",
    ],
    ["a node missing", "x,y,u\n0,0,1\n0,1,1\n1,1,1\n", "grid/missing-node", "x = 1, y = 0", "1 are missing"],
    ["the last node missing", "x,y,u\n0,0,1\n0,1,1\n1,0,1\n", "grid/missing-node", "x = 1, y = 1", "4 nodes"],
    [
      "rounded coordinates",
      "x,y,u\n0,0,1\n1e-17,1,1\n1,0,1\n1,1,1\n",
      "grid/missing-node",
      "x = 0, y = 1",
      "rounding",
    ],
  ])("%s", (_, text, code, where, said) => {
    const refusal = refusalOf(() => readFieldFile("run.csv", encode(text)));
    expect(refusal).toMatchObject({ code, where });
    expect(refusal.message).toContain(said);
  });

  test("or the byte, where the text is not UTF-8", () => {
    const latin = Uint8Array.of(...encode("x,u\n# caf"), 0xe9, ...encode("\n0,1\n"));
    expect(refusalOf(() => readFieldFile("run.csv", latin))).toMatchObject({
      code: "format/not-utf8",
      where: "byte 9",
    });
    const cut = encode("x,u\n0,1\n# é").slice(0, -1);
    expect(refusalOf(() => readFieldFile("run.csv", cut))).toMatchObject({ where: "byte 10" });
    const wide = Uint8Array.of(0xff, 0xfe, 0x78, 0);
    expect(refusalOf(() => readFieldFile("run.csv", wide)).message).toContain("UTF-16");
  });

  test("for a grid that would take 10^12 nodes, without allocating it", () => {
    const rows = Array.from({ length: 10000 }, (_, i) => `${i},${i},${i},0`);
    const refusal = refusalOf(() => readFieldFile("run.csv", encode(["t,x,y,u", ...rows].join("\n"))));
    expect(refusal).toMatchObject({ code: "grid/missing-node", where: "t = 0, x = 0, y = 1" });
    expect(refusal.message).toContain("1000000000000 nodes");
  });

  test("where the limits would be exceeded, before anything is allocated", () => {
    const bytes = encode(`x,u\n${"\n".repeat(100)}0,1\n`);
    const nodes = refusalOf(() => readFieldFile("run.csv", bytes, { ...defaultLimits, maxNodes: 64 }));
    expect(nodes).toMatchObject({ code: "format/too-many-values", where: "row 1" });
    const size = refusalOf(() => readFieldFile("run.csv", bytes, { ...defaultLimits, maxUnpackedBytes: 64 }));
    expect(size).toMatchObject({ code: "format/too-large", where: "row 1" });
  });
});

describe("a number in a table", () => {
  test.each([
    ["1", 1],
    ["+1.", 1],
    [".5", 0.5],
    ["-0", -0],
    ["1e400", Infinity],
    ["0.1000000000000000055511151231257827", 0.1],
    ["1.7976931348623157e308", Number.MAX_VALUE],
    ["5e-324", Number.MIN_VALUE],
    ["1.0D-03", 1e-3],
    ["3.14-114", 3.14e-114],
    ["-3.14+114", -3.14e114],
    ["3,14-114", 3.14e-114],
  ])("%s is read as the nearest double", (text, value) => {
    expect(readTableNumber(text)).toMatchObject({ value });
  });

  test.each(["1-114", "3.14-14", "1e", "e5", ".", "-", "1_000", "1 2", "0b1", "1f", "1.2.3", "--1"])(
    "%s is none",
    (text) => {
      expect(readTableNumber(text)).toHaveProperty("problem");
    },
  );

  test("written with 17 significant digits comes back bit for bit", () => {
    const random = makeRandom(11);
    for (let round = 0; round < 2000; round++) {
      const value = (random() - 0.5) * 10 ** Math.floor(600 * random() - 300);
      expect(readTableNumber(value.toExponential(16))).toMatchObject({ value });
    }
  });
});

test("a mutated table is read or refused with a place", () => {
  const seed = Number(process.env.MUTATION_SEED ?? 20260);
  const random = makeRandom(seed);
  const bytes = encode(
    '# made\nx,"y",u\n' +
      [0, 1, 2, 3].flatMap((x) => [0, 0.5].map((y) => `${x},${y},${Math.sin(x + y)}`)).join("\n"),
  );
  let refused = 0;
  for (let round = 0; round < 3000; round++) {
    const mutated = bytes.slice();
    for (let k = 0; k < 1 + Math.floor(3 * random()); k++) {
      mutated[Math.floor(random() * mutated.length)] = Math.floor(160 * random());
    }
    try {
      expect(readFieldFile("run.csv", mutated).arrays.has("x")).toBe(true);
    } catch (error) {
      if (!(error instanceof DataError)) throw new Error(`round ${round} of seed ${seed}`, { cause: error });
      expect(error.where, error.message).toMatch(/^(row|byte|x =|y =|t =) ?\S+/);
      refused++;
    }
  }
  console.info(`table: seed ${seed}, 3000 mutations, ${refused} refused`);
});
