import { Busboy, type BusboyFileStream, type BusboyInstance } from "@fastify/busboy";
import { LARGEST_FILE } from "@/api-spec/records/attachments";
import { Problem, pointerTo, type ProblemFault, refusal } from "@/lib/problems/problem";

const MIB = 1024 ** 2;
const FILE = "file";
const LIMITS = { files: 2, fields: 8, parts: 10, fileSize: LARGEST_FILE, fieldSize: 8_192, headerPairs: 20, headerSize: 8_192 };

/** What a form holds, whether it fits or not. */
export interface FormContent {
  file: Buffer;
  fileName: string;
  fields: Record<string, string>;
}

/** A form with a file, read piece by piece. The file is held once, in a buffer of the size it can have at most. */
export class AttachmentFormReader {
  private readonly parser: BusboyInstance;
  private readonly buffer: Buffer;
  private readonly fields = new Map<string, string>();
  private readonly faults: ProblemFault[] = [];
  private readonly finished: Promise<void>;
  private fileName: string | null = null;
  private size = 0;
  private tooLarge = false;

  /** @param declaredBytes Length of the whole form, where it is known. */
  constructor(contentType: string, declaredBytes: number | null) {
    this.parser = parserFor(contentType);
    // Memory that is never written to is never taken from the system either.
    this.buffer = Buffer.allocUnsafeSlow(Math.min(declaredBytes ?? LARGEST_FILE, LARGEST_FILE));
    this.finished = new Promise((resolve, reject) => this.parser.once("finish", resolve).once("error", reject));
    // What fails before the end is asked for is told there.
    this.finished.catch(() => undefined);
    this.parser.on("file", (name, stream, fileName) => this.takeFile(name, stream, fileName));
    this.parser.on("field", (name, value, _nameTruncated, truncated) => this.takeField(name, value, truncated));
    for (const limit of ["filesLimit", "fieldsLimit", "partsLimit"]) this.parser.on(limit, () => this.fault([], "too_many_parts", "The form has more parts than this operation takes."));
  }

  /** Takes the next piece; resolves when there is room for another. */
  async write(chunk: Uint8Array): Promise<void> {
    const written = new Promise<void>((resolve) => this.parser.write(chunk, () => resolve()));
    await Promise.race([written, this.finished]).catch(() => undefined);
  }

  /** The whole form. Throws the problem that says what does not fit. */
  async end(): Promise<FormContent> {
    this.parser.end();
    await this.finished.catch(() => {
      throw notAForm("The form is cut off, or its parts are not divided as RFC 7578 has it.");
    });
    if (this.tooLarge) throw fileTooLarge();
    if (this.fileName === null) this.fault([], "missing_field", 'The part "file" is missing.');
    if (this.faults[0]) throw new Problem("invalid-request", { detail: this.faults[0].detail, errors: this.faults });
    return { file: this.buffer.subarray(0, this.size), fileName: this.fileName ?? "", fields: Object.fromEntries(this.fields) };
  }

  private takeFile(name: string, stream: BusboyFileStream, fileName: string | undefined): void {
    stream.on("error", () => undefined);
    if (name !== FILE || this.fileName !== null) {
      stream.resume();
      this.fault([name], name === FILE ? "repeated" : "unrecognized_field", name === FILE ? "The form has more than one file." : `The field "${name}" is not defined here; the file is in "${FILE}".`);
      return;
    }
    this.fileName = fileName ?? "";
    stream.on("limit", () => (this.tooLarge = true));
    stream.on("data", (chunk: Buffer) => {
      this.buffer.set(chunk, this.size);
      this.size += chunk.length;
    });
  }

  private takeField(name: string, value: string, truncated: boolean): void {
    if (truncated) this.fault([name], "too_large", `Takes at most ${LIMITS.fieldSize} bytes.`);
    else if (this.fields.has(name)) this.fault([name], "repeated", `The form has "${name}" more than once.`);
    else this.fields.set(name, value);
  }

  private fault(path: string[], code: string, detail: string): void {
    this.faults.push({ pointer: pointerTo(path), code, detail });
  }
}

function parserFor(contentType: string): BusboyInstance {
  try {
    return new Busboy({ headers: { "content-type": contentType }, limits: LIMITS, isPartAFile: (name, _type, fileName) => name === FILE || fileName !== undefined });
  } catch {
    throw notAForm("The Content-Type names no boundary between the form's parts.");
  }
}

const notAForm = (detail: string): Problem => refusal("invalid-request", detail, { code: "form_malformed" });

function fileTooLarge(): Problem {
  const detail = `The file is larger than the ${LARGEST_FILE / MIB} MiB that an attachment can have.`;
  return new Problem("body-too-large", { detail, errors: [{ pointer: "/file", code: "file_too_large", detail }] });
}
