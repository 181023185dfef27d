import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { axisTicks } from "@/app/_components/data/axisTicks";
import { formatBytes, formatCount, formatNumber, formatQuantity, formatShare } from "@/app/_components/format/number";
import { themeFrom } from "@/app/_components/shell/themes";

describe("numbers on pages", () => {
  it("separates thousands and never shortens a count", () => {
    expect(formatNumber(38214)).toBe("38,214");
    expect(formatNumber(123_456_789)).toBe("123,456,789");
    expect(formatCount(1, "key")).toBe("1\u00a0key");
    expect(formatCount(2_000, "key")).toBe("2,000\u00a0keys");
  });
  it("writes a true minus sign, and none before a nought", () => {
    expect(formatNumber(-12.5)).toBe("−12.5");
    expect(formatNumber(-0.001, { decimals: 1 })).toBe("0.0");
  });
  it("writes an en dash for what is no number", () => {
    expect([formatNumber(null), formatNumber(Number.NaN), formatNumber(Number.POSITIVE_INFINITY)]).toEqual(["–", "–", "–"]);
  });
  it("writes units as people do", () => {
    expect(formatQuantity({ value: 2600, unit: "ft3/min" })).toBe("2,600\u00a0ft³/min");
    expect(formatQuantity({ value: 0.0612, unit: "in_wg" }, { decimals: 3 })).toBe("0.061\u00a0in. w.g.");
    expect(formatShare(0.764)).toBe("76.4\u00a0%");
  });
  it("steps through binary multiples of a byte", () => {
    expect([0, 1023, 1024, 1536, 1024 ** 2].map(formatBytes)).toEqual(["0\u00a0B", "1,023\u00a0B", "1.0\u00a0KiB", "1.5\u00a0KiB", "1.0\u00a0MiB"]);
  });
});

describe("the axis of a chart", () => {
  it("steps by 1, 2 or 5 and ends at or just above the greatest value", () => {
    expect(axisTicks(37)).toEqual([0, 10, 20, 30, 40]);
    fc.assert(
      fc.property(fc.double({ min: 0.5, max: 1e9, noNaN: true }), (greatest) => {
        const ticks = axisTicks(greatest);
        const step = ticks[1] ?? 0;
        const last = ticks.at(-1) ?? 0;
        expect(last).toBeGreaterThanOrEqual(greatest);
        expect(last - greatest).toBeLessThan(step);
        expect(ticks.length).toBeLessThanOrEqual(6);
      }),
    );
  });
});

describe("the theme in a cookie", () => {
  it("is light, dark or nothing, whatever is written there", () => {
    expect(["light", "dark", "", "system", '"><script>', undefined].map(themeFrom)).toEqual(["light", "dark", undefined, undefined, undefined, undefined]);
  });
});
