import tseslint from "typescript-eslint";
import hooks from "eslint-plugin-react-hooks";

/** Imports run one way: app → lib/http → lib/* → db; api-spec knows lib/airflow; lib/airflow knows nobody. */
const forbid = (files, groups, message) => ({
  files,
  rules: { "no-restricted-imports": ["error", { patterns: [{ group: groups, message }] }] },
});

export default tseslint.config(
  { ignores: ["node_modules/", "**/.next*/", ".data/", "next-env.d.ts", "examples/"] },
  ...tseslint.configs.recommended,
  hooks.configs.flat["recommended-latest"],
  {
    rules: {
      "@typescript-eslint/no-unused-vars": ["error", { argsIgnorePattern: "^_", varsIgnorePattern: "^_" }],
      "@typescript-eslint/consistent-type-imports": "error",
      eqeqeq: ["error", "always", { null: "ignore" }],
    },
  },
  forbid(["lib/airflow/**"], ["@/app/*", "@/api-spec/*", "@/db/*", "@/lib/!(airflow)/**", "node:*", "next", "next/*", "zod", "knex"], "The engine is pure: it knows nobody."),
  forbid(["api-spec/**"], ["@/app/*", "@/db/*", "@/lib/!(airflow)/**", "next", "next/*"], "The contract knows the engine and nobody else."),
  forbid(["lib/http/**"], ["@/app/*", "next", "next/*"], "Operations are plain web functions; they know neither pages nor Next.js."),
  forbid(["lib/!(airflow|http|launch)/**"], ["@/app/*", "@/lib/http/*", "next", "next/*"], "What the product does knows neither HTTP's pipeline nor pages."),
  forbid(["db/**"], ["@/app/*", "@/api-spec/*", "@/lib/http/*", "next", "next/*"], "The database layer stands at the bottom."),
);
