/** Times are shown in UTC, as they are stored and signed; the zone is written beside them. */
const STYLES: Record<TimeStyle, Intl.DateTimeFormatOptions> = {
  date: { day: "numeric", month: "short", year: "numeric" },
  minute: { day: "numeric", month: "short", year: "numeric", hour: "2-digit", minute: "2-digit", hourCycle: "h23" },
  second: { day: "numeric", month: "short", year: "numeric", hour: "2-digit", minute: "2-digit", second: "2-digit", hourCycle: "h23" },
};

export type TimeStyle = "date" | "minute" | "second";

interface TimeProps {
  /** RFC 3339 text or a Date; null shows `absent`. */
  value: string | Date | null | undefined;
  style?: TimeStyle;
  /** BCP 47 tag of the words and their order. */
  locale?: string;
  /** In place of a time that is not there: "Never". */
  absent?: string;
}

/** A moment: "1 Dec 2026, 10:32 UTC". The exact time is in its title and its `dateTime`. */
export function Time({ value, style = "minute", locale = "en-GB", absent = "–" }: TimeProps) {
  if (value == null) return <>{absent}</>;
  const moment = new Date(value);
  if (Number.isNaN(moment.getTime())) return <>{absent}</>;
  const exact = moment.toISOString();
  const text = new Intl.DateTimeFormat(locale, { ...STYLES[style], timeZone: "UTC" }).format(moment);
  return (
    <time dateTime={exact} title={exact} className="whitespace-nowrap">
      {text}
      {style !== "date" && " UTC"}
    </time>
  );
}
