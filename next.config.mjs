/** @type {import("next").NextConfig} */
export default {
  distDir: process.env.AVERDUCT_DIST_DIR ?? ".next",
  poweredByHeader: false,
  // The reverse proxy compresses; here it would cost the API up to a third of its speed.
  compress: false,
  reactStrictMode: true,
  serverExternalPackages: ["knex", "mysql2", "pino", "@node-rs/argon2", "nodemailer", "rate-limiter-flexible"],
  // `npm run check` and `npm test` check types; a start need not do it again.
  typescript: { ignoreBuildErrors: true },
  async headers() {
    return [
      {
        source: "/(.*)",
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
