// Swagger UI's parser registers its elements by the side effect of a module that the bundler otherwise leaves out
// when it follows re-exports; in the CommonJS build it cannot.
const PARSER_PACKAGES = [
  "apidom-ast", "apidom-core", "apidom-ns-openapi-3-0", "apidom-ns-openapi-3-1", "apidom-ns-openapi-3-2", "apidom-ns-json-schema-draft-4", "apidom-ns-json-schema-draft-6",
  "apidom-ns-json-schema-draft-7", "apidom-ns-json-schema-2019-09", "apidom-ns-json-schema-2020-12",
];
const parserAliases = Object.fromEntries(PARSER_PACKAGES.map((name) => [`@swagger-api/${name}`, `./node_modules/@swagger-api/${name}/src/index.cjs`]));

/** @type {import("next").NextConfig} */
export default {
  distDir: process.env.AVERDUCT_DIST_DIR ?? ".next",
  poweredByHeader: false,
  // The reverse proxy compresses; here it would cost the API up to a third of its speed.
  compress: false,
  reactStrictMode: true,
  turbopack: { resolveAlias: parserAliases },
  serverExternalPackages: ["knex", "mysql2", "pino", "@node-rs/argon2", "nodemailer", "rate-limiter-flexible", "pdfkit", "fontkit", "qrcode"],
  // `npm run check` and `npm test` check types; a start need not do it again.
  typescript: { ignoreBuildErrors: true },
  async headers() {
    return [
      {
        // Pages only: the API sets what it needs itself, without Next.js matching its paths.
        source: "/((?!api/).*)",
        headers: [
          { key: "X-Content-Type-Options", value: "nosniff" },
          { key: "Referrer-Policy", value: "strict-origin-when-cross-origin" },
          { key: "X-Frame-Options", value: "DENY" },
          { key: "Permissions-Policy", value: "camera=(), geolocation=(), microphone=()" },
        ],
      },
    ];
  },
};
