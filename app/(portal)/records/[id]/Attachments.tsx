import { formatBytes } from "@/app/_components/format/number";
import type { Attachment } from "@/lib/records/attachments/row";

/** Photographs and documents of the record, through links that end after some minutes. */
export function Attachments({ items }: { items: Attachment[] }) {
  if (items.length === 0) return <p className="text-muted">None. A partner&apos;s program attaches photographs and documents while the traverse is a draft.</p>;
  return (
    <ul className="grid grid-cols-2 gap-4 sm:grid-cols-4">
      {items.map(({ id, url, caption, fileName, mediaType, bytes }) => (
        <li key={id} className="min-w-0 border bg-card p-2">
          <a href={url} className="block">
            {mediaType.startsWith("image/") && <img src={url} alt={caption ?? fileName} loading="lazy" className="mb-2 aspect-4/3 w-full object-cover" />}
            <span className="link break-words">{caption ?? fileName}</span>
          </a>
          <span className="block text-small text-muted">{mediaType.split("/")[1]!.toUpperCase()}, {formatBytes(bytes)}</span>
        </li>
      ))}
    </ul>
  );
}
