/** A drawing made by the engine, set into the page: it takes the page's colours and fills the width it is given. */
export function Figure({ svg }: { svg: string }) {
  // The engine escapes every word it writes into a drawing.
  return <div className="mx-auto max-w-180 min-w-0 [&>svg]:block [&>svg]:h-auto [&>svg]:w-full" dangerouslySetInnerHTML={{ __html: svg }} />;
}
