/** An SVG answer. It may hold nothing but the drawing: whoever opens it runs no script of anybody's. */
export const drawing = (svg: string): Response =>
  new Response(svg, { headers: { "Content-Type": "image/svg+xml; charset=utf-8", "Content-Security-Policy": "default-src 'none'; style-src 'unsafe-inline'", "Cache-Control": "private, no-cache" } });
