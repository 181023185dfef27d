import { describe, expect, it } from "vitest";
import { displayName, inlineDisposition } from "@/lib/records/attachments/fileName";
import { mediaTypeOf } from "@/lib/records/attachments/formats/mediaType";
import { Problem } from "@/lib/problems/problem";

/** A gradient of 16 × 16, written by ImageMagick 6.9.11-60. */
const BASELINE_JPEG = Buffer.from("/9j/4AAQSkZJRgABAQAAAQABAAD/2wBDAAMCAgICAgMCAgIDAwMDBAYEBAQEBAgGBgUGCQgKCgkICQkKDA8MCgsOCwkJDRENDg8QEBEQCgwSExIQEw8QEBD/2wBDAQMDAwQDBAgEBAgQCwkLEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBD/wAARCAAQABADAREAAhEBAxEB/8QAFgABAQEAAAAAAAAAAAAAAAAAAAcI/8QAFxAAAwEAAAAAAAAAAAAAAAAAAAEVUv/EABYBAQEBAAAAAAAAAAAAAAAAAAAIBP/EABcRAAMBAAAAAAAAAAAAAAAAAAAWYhf/2gAMAwEAAhEDEQA/AMsXVszZ1BfD5QurYzqA+UTy6tl551BFj5QurYzqA+Uf/9k=", "base64");
const PROGRESSIVE_JPEG = Buffer.from("/9j/4AAQSkZJRgABAQAAAQABAAD/2wBDAAMCAgICAgMCAgIDAwMDBAYEBAQEBAgGBgUGCQgKCgkICQkKDA8MCgsOCwkJDRENDg8QEBEQCgwSExIQEw8QEBD/2wBDAQMDAwQDBAgEBAgQCwkLEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBAQEBD/wgARCAAQABADAREAAhEBAxEB/8QAFgABAQEAAAAAAAAAAAAAAAAAAAYH/8QAFgEBAQEAAAAAAAAAAAAAAAAAAAcD/9oADAMBAAIQAxAAAAHK8r4J69RUf//EABUQAQEAAAAAAAAAAAAAAAAAAAAT/9oACAEBAAEFArrrrv/EABYRAAMAAAAAAAAAAAAAAAAAAAAVYf/aAAgBAwEBPwF9R9R9R9T/xAAWEQADAAAAAAAAAAAAAAAAAAAAFmH/2gAIAQIBAT8BXYLsF2C7D//EABQQAQAAAAAAAAAAAAAAAAAAACD/2gAIAQEABj8CH//EABUQAQEAAAAAAAAAAAAAAAAAAABx/9oACAEBAAE/IaUpT//aAAwDAQACAAMAAAAQ2J//xAAUEQEAAAAAAAAAAAAAAAAAAAAg/9oACAEDAQE/EAAf/8QAFBEBAAAAAAAAAAAAAAAAAAAAIP/aAAgBAgEBPxAf/wD/xAAVEAEBAAAAAAAAAAAAAAAAAAAAEf/aAAgBAQABPxCWWWX/2Q==", "base64");
const PNG = Buffer.from("iVBORw0KGgoAAAANSUhEUgAAABAAAAAQBAMAAADt3eJSAAAAMFBMVEX/AADuABHdACLMADO7AESqAFWZAGaIAHd3AIhmAJlVAKpEALszAMwiAN0RAO4AAP8lworGAAAAO0lEQVQI1zXBwQAAIQAAwVVIIYUUUkghhRRSSCGFUziFFFKozzYDTxBRJJFFEVU00cUQU3ziF0tscXQBlZU/wUAVODIAAAAASUVORK5CYII=", "base64");
/** An empty page, written by Ghostscript's pdfwrite. */
const PDF = Buffer.from("JVBERi0xLjcKJcfsj6IKJSVJbnZvY2F0aW9uOiBncyAtcSAtc0RFVklDRT1wZGZ3cml0ZSA/ID8gPyA/CjUgMCBvYmoKPDwvTGVuZ3RoIDYgMCBSL0ZpbHRlciAvRmxhdGVEZWNvZGU+PgpzdHJlYW0KeJwrVDDQM1QwAEEonZzLFcgFADVJBGVlbmRzdHJlYW0KZW5kb2JqCjYgMCBvYmoKMjMKZW5kb2JqCjQgMCBvYmoKPDwvVHlwZS9QYWdlL01lZGlhQm94IFswIDAgNTk1IDg0Ml0KL1BhcmVudCAzIDAgUgovUmVzb3VyY2VzPDwvUHJvY1NldFsvUERGXQo+PgovQ29udGVudHMgNSAwIFIKPj4KZW5kb2JqCjMgMCBvYmoKPDwgL1R5cGUgL1BhZ2VzIC9LaWRzIFsKNCAwIFIKXSAvQ291bnQgMQo+PgplbmRvYmoKMSAwIG9iago8PC9UeXBlIC9DYXRhbG9nIC9QYWdlcyAzIDAgUgovTWV0YWRhdGEgNyAwIFIKPj4KZW5kb2JqCjcgMCBvYmoKPDwvVHlwZS9NZXRhZGF0YQovU3VidHlwZS9YTUwvTGVuZ3RoIDExNzM+PnN0cmVhbQo8P3hwYWNrZXQgYmVnaW49J++7vycgaWQ9J1c1TTBNcENlaGlIenJlU3pOVGN6a2M5ZCc/Pgo8P2Fkb2JlLXhhcC1maWx0ZXJzIGVzYz0iQ1JMRiI/Pgo8eDp4bXBtZXRhIHhtbG5zOng9J2Fkb2JlOm5zOm1ldGEvJyB4OnhtcHRrPSdYTVAgdG9vbGtpdCAyLjkuMS0xMywgZnJhbWV3b3JrIDEuNic+CjxyZGY6UkRGIHhtbG5zOnJkZj0naHR0cDovL3d3dy53My5vcmcvMTk5OS8wMi8yMi1yZGYtc3ludGF4LW5zIycgeG1sbnM6aVg9J2h0dHA6Ly9ucy5hZG9iZS5jb20vaVgvMS4wLyc+CjxyZGY6RGVzY3JpcHRpb24gcmRmOmFib3V0PSIiIHhtbG5zOnBkZj0naHR0cDovL25zLmFkb2JlLmNvbS9wZGYvMS4zLycgcGRmOlByb2R1Y2VyPSdHUEwgR2hvc3RzY3JpcHQgMTAuMDAuMCcvPgo8cmRmOkRlc2NyaXB0aW9uIHJkZjphYm91dD0iIiB4bWxuczp4bXA9J2h0dHA6Ly9ucy5hZG9iZS5jb20veGFwLzEuMC8nPjx4bXA6TW9kaWZ5RGF0ZT4yMDI2LTEyLTAxVDE1OjU5OjI5WjwveG1wOk1vZGlmeURhdGU+Cjx4bXA6Q3JlYXRlRGF0ZT4yMDI2LTEyLTAxVDE1OjU5OjI5WjwveG1wOkNyZWF0ZURhdGU+Cjx4bXA6Q3JlYXRvclRvb2w+VW5rbm93bkFwcGxpY2F0aW9uPC94bXA6Q3JlYXRvclRvb2w+PC9yZGY6RGVzY3JpcHRpb24+CjxyZGY6RGVzY3JpcHRpb24gcmRmOmFib3V0PSIiIHhtbG5zOnhhcE1NPSdodHRwOi8vbnMuYWRvYmUuY29tL3hhcC8xLjAvbW0vJyB4YXBNTTpEb2N1bWVudElEPSd1dWlkOmJkNmVkODNmLTI1YmMtMTFmZC0wMDAwLTk4YmNlNDg1ZGU3MicvPgo8cmRmOkRlc2NyaXB0aW9uIHJkZjphYm91dD0iIiB4bWxuczpkYz0naHR0cDovL3B1cmwub3JnL2RjL2VsZW1lbnRzLzEuMS8nIGRjOmZvcm1hdD0nYXBwbGljYXRpb24vcGRmJz48ZGM6dGl0bGU+PHJkZjpBbHQ+PHJkZjpsaSB4bWw6bGFuZz0neC1kZWZhdWx0Jz5VbnRpdGxlZDwvcmRmOmxpPjwvcmRmOkFsdD48L2RjOnRpdGxlPjwvcmRmOkRlc2NyaXB0aW9uPgo8L3JkZjpSREY+CjwveDp4bXBtZXRhPgogICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAKICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgICAgCjw/eHBhY2tldCBlbmQ9J3cnPz4KZW5kc3RyZWFtCmVuZG9iagoyIDAgb2JqCjw8L1Byb2R1Y2VyKEdQTCBHaG9zdHNjcmlwdCAxMC4wMC4wKQovQ3JlYXRpb25EYXRlKEQ6MjAyNjEyMDExNTU5MjlaMDAnMDAnKQovTW9kRGF0ZShEOjIwMjYxMjAxMTU1OTI5WjAwJzAwJyk+PmVuZG9iagp4cmVmCjAgOAowMDAwMDAwMDAwIDY1NTM1IGYgCjAwMDAwMDAzNDUgMDAwMDAgbiAKMDAwMDAwMTY1OCAwMDAwMCBuIAowMDAwMDAwMjg2IDAwMDAwIG4gCjAwMDAwMDAxNzIgMDAwMDAgbiAKMDAwMDAwMDA2MSAwMDAwMCBuIAowMDAwMDAwMTU0IDAwMDAwIG4gCjAwMDAwMDA0MDkgMDAwMDAgbiAKdHJhaWxlcgo8PCAvU2l6ZSA4IC9Sb290IDEgMCBSIC9JbmZvIDIgMCBSCi9JRCBbPEMwODFDRjE0QUQzODZDMTgxQzAxNUE4MzJGQzc2MjVBPjxDMDgxQ0YxNEFEMzg2QzE4MUMwMTVBODMyRkM3NjI1QT5dCj4+CnN0YXJ0eHJlZgoxNzg0CiUlRU9GCg==", "base64");

const FILES = [["a baseline JPEG", BASELINE_JPEG, "image/jpeg"], ["a progressive JPEG", PROGRESSIVE_JPEG, "image/jpeg"], ["a PNG", PNG, "image/png"], ["a PDF", PDF, "application/pdf"]] as const;

/** The type, or the code of what is wrong. */
function told(bytes: Buffer): string {
  try {
    return mediaTypeOf(bytes);
  } catch (error) {
    if (error instanceof Problem) return error.details.errors![0]!.code;
    throw error;
  }
}

describe.each(FILES)("%s", (_, file, mediaType) => {
  it("is told from its content", () => expect(told(file)).toBe(mediaType));

  it("is refused cut off at any byte", () => {
    // A PDF's last line may lack its end.
    const least = mediaType === "application/pdf" ? file.toString("latin1").trimEnd().length : file.length;
    for (let length = 0; length < least; length += 1) expect(["file_damaged", "file_type_not_taken"], `at ${length}`).toContain(told(file.subarray(0, length)));
  });

  it("is refused with any byte after its end that is no blank", () => {
    for (let byte = 1; byte < 256; byte += 1) {
      const blank = mediaType === "application/pdf" && /\s/.test(String.fromCharCode(byte));
      expect(told(Buffer.concat([file, Buffer.from([byte])])), String(byte)).toBe(blank ? mediaType : mediaType === "application/pdf" ? "file_damaged" : "data_after_end");
    }
  });

  it("is refused with a file of another type behind it", () => {
    for (const [, other, otherType] of FILES) if (otherType !== mediaType) expect(told(Buffer.concat([file, other]))).not.toMatch(/^(image|application)\//);
  });
});

describe("a JPEG", () => {
  it("may have further pictures behind it, with zeros between (CIPA DC-007)", () => {
    expect(told(Buffer.concat([BASELINE_JPEG, PROGRESSIVE_JPEG]))).toBe("image/jpeg");
    expect(told(Buffer.concat([BASELINE_JPEG, Buffer.alloc(100), PROGRESSIVE_JPEG, Buffer.alloc(3)]))).toBe("image/jpeg");
    expect(told(Buffer.concat([BASELINE_JPEG, PROGRESSIVE_JPEG.subarray(0, -1)]))).toBe("data_after_end");
  });

  it("needs a frame before its scan, and a scan", () => {
    const [start, end] = [Buffer.from([0xff, 0xd8]), Buffer.from([0xff, 0xd9])];
    expect(told(Buffer.concat([start, end]))).toBe("file_damaged");
    expect(told(Buffer.concat([start, Buffer.from([0xff, 0xfe, 0x00, 0x04, 0x3c, 0x3e]), end]))).toBe("file_damaged");
    expect(told(Buffer.concat([start, Buffer.from([0xff, 0xda, 0x00, 0x02, 0x00]), end]))).toBe("file_damaged");
  });

  it("does not end within a segment that holds the bytes of an end", () => {
    const [head, rest] = [BASELINE_JPEG.subarray(0, 2), BASELINE_JPEG.subarray(2)];
    expect(told(Buffer.concat([head, Buffer.from([0xff, 0xfe, 0x00, 0x06, 0xff, 0xd9, 0xff, 0xd8]), rest]))).toBe("image/jpeg");
  });
});

describe("a PNG", () => {
  it("is refused with any one byte changed", () => {
    for (let at = 0; at < PNG.length; at += 1) {
      const changed = Buffer.from(PNG);
      changed[at]! ^= 0x01;
      expect(told(changed), `at ${at}`).not.toBe("image/png");
    }
  });
});

describe("a file's name", () => {
  it.each([
    ["photo.jpg", "photo.jpg"], ["a/b\\c.png", "c.png"], ["tab\tand\nline.png", "tabandline.png"], ["  two   words .png ", "two words .png"],
    ["\uD800.png", ".png"], ["", "attachment.png"], ["...", "attachment.png"], ["/", "attachment.png"], ["\u202Egnp.exe", "gnp.exe"], ["\u{1F527}".repeat(201), "\u{1F527}".repeat(200)],
  ])("%j is shown as %j", (sent, shown) => expect(displayName(sent, "image/png")).toBe(shown));

  it("stands in a header without a way out of it", () => {
    // RFC 8187, 3.2.1: of ASCII only attr-char stands as it is.
    const every = String.fromCharCode(...Array.from({ length: 95 }, (_, index) => index + 32));
    const value = inlineDisposition(every).replace("inline; filename*=UTF-8''", "");
    expect(value.replace(/%[0-9A-F]{2}/g, "")).toMatch(/^[A-Za-z0-9!#$&+\-.^_`|~]*$/);
    expect(decodeURIComponent(value)).toBe(every);
    // RFC 8187, 3.2.3, the example of a pound and a euro sign (from memory; it writes the hexadecimal in lower case).
    expect(inlineDisposition("\u00A3 and \u20AC rates")).toBe("inline; filename*=UTF-8''%C2%A3%20and%20%E2%82%AC%20rates");
  });
});
