import { describe, expect, it } from "vitest";
import { harmless } from "@/lib/records/exports/csv";
import { readCell, readLine, readNumber } from "@/lib/records/imports/readCell";
import { delimiterOf, readRows, type FileRow } from "@/lib/records/imports/readRows";

describe("a cell of an export", () => {
  it.each(["=1+1", "+1+1", "-1+1", "@A1", "\t=1", "\r=1", "\n=1", "＝1", "-", "+", "--1", "=", "-1,5", "=-5"])("%j is no formula", (text) => {
    expect(harmless(text)).toBe(`'${text}`);
  });
  it.each(["-5", "+5.25", "0", "AHU-1", "a=b", "", "1e3", " =1"])("%j stays as it is", (text) => {
    expect(harmless(text)).toBe(text);
  });
});

describe("a number in a cell", () => {
  it.each([["0.041", 0.041], ["-1.2", -1.2], ["−1.2", -1.2], ["+3", 3], [".5", 0.5], ["5.", 5], ["1e-3", 0.001], ["1E3", 1000]])("%s", (cell, value) => {
    expect(readNumber(cell, false)).toEqual({ value });
  });
  it.each([["0,041", 0.041], ["-1,2", -1.2], ["7", 7], ["1,5e2", 150]])("%s with a decimal comma", (cell, value) => {
    expect(readNumber(cell, true)).toEqual({ value });
  });
  it.each(["", "1,640", "1 640", "0x10", "NaN", "Infinity", "1e999", "1e9999", "1.2.3", "#VALUE!", "=1", "½", "１"])("%j is none", (cell) => {
    expect(readNumber(cell, false)).toMatchObject({ code: "not_a_number" });
  });
  it.each(["1.640,5", "1.5", "1,2,3"])("%j is none with a decimal comma", (cell) => {
    expect(readNumber(cell, true)).toMatchObject({ code: "not_a_number" });
  });
});

describe("other cells", () => {
  it("yes and no, names in any case, units, counts", () => {
    expect(readCell("YES", { is: "yes_or_no" }, false)).toEqual({ value: true });
    expect(readCell("0", { is: "yes_or_no" }, false)).toEqual({ value: false });
    expect(readCell("maybe", { is: "yes_or_no" }, false)).toMatchObject({ code: "not_yes_or_no" });
    expect(readCell("Log-Tchebycheff", { is: "choice", of: ["log_tchebycheff"] }, false)).toEqual({ value: "log_tchebycheff" });
    expect(readCell("INHG", { is: "unit", of: ["pressure"] }, false)).toEqual({ value: "inHg" });
    expect(readCell("constructor", { is: "unit", of: ["pressure"] }, false)).toMatchObject({ code: "not_known" });
    expect(readCell("2.5", { is: "count" }, false)).toMatchObject({ code: "not_a_count" });
  });
  it("readings of a line, with one that could not be read", () => {
    expect(readLine("0,041 -  0,055\n−0,01", true)).toEqual({ values: [0.041, null, 0.055, -0.01] });
    expect(readLine("1 2 x", false)).toMatchObject({ code: "not_a_number", detail: expect.stringMatching(/^Point 3: /) });
  });
});

describe("rows", () => {
  const rowsOf = async (text: string): Promise<FileRow[]> => {
    const rows = [];
    for await (const row of readRows(text, delimiterOf(text))) rows.push(row);
    return rows;
  };
  it("are numbered as a spreadsheet does, however long the file is", async () => {
    const text = `a,b\n${Array.from({ length: 3_000 }, (_, index) => `${index},"x\ny"\n\n,\n`).join("")}`;
    const rows = await rowsOf(text);
    expect(rows).toHaveLength(3_001);
    expect(rows.map(({ number }) => number)).toEqual([1, ...Array.from({ length: 3_000 }, (_, index) => 2 + 3 * index)]);
  });
  it.each([["a,b;c,d", "comma"], ["a;b;c", "semicolon"], ["a\tb\tc", "tab"], ["a", "comma"], ["\n\na;b", "semicolon"]] as const)("%j is delimited by %s", (text, name) => {
    expect(delimiterOf(text)).toBe(name);
  });
});
