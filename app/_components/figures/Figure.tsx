interface FigureProps {
  svg: string;
  /** The same drawn for a telephone, where the letters of the other would be too small to read. */
  narrow?: string;
}

const FRAME = "mx-auto max-w-180 min-w-0 [&>svg]:block [&>svg]:h-auto [&>svg]:w-full";

/** A drawing made by the engine, set into the page: it takes the page's colours and fills the width it is given. */
export function Figure({ svg, narrow }: FigureProps) {
  // The engine escapes every word it writes into a drawing.
  const wide = <div className={narrow ? `${FRAME} hidden sm:block print:block` : FRAME} dangerouslySetInnerHTML={{ __html: svg }} />;
  if (!narrow) return wide;
  return (
    <>
      {wide}
      <div className={`${FRAME} sm:hidden print:hidden`} dangerouslySetInnerHTML={{ __html: narrow }} />
    </>
  );
}
