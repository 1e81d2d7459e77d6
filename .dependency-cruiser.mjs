/**
 * Which room may know which. Each rule's comment is printed with what breaks it.
 * Order of the pure core: units, code <- diagram, equipment, symbols <- calc, states <-
 * rules, schedules, sheets, policy, workflow; above it server and client, components, app.
 */
const room = (...names) => `^lib/(${names.join("|")})/`;
const TIERS = [["units", "code"], ["diagram", "equipment", "symbols"], ["calc", "states"], ["rules", "schedules", "sheets", "policy", "workflow"]];

/** A tier may not reach one above it. */
const tierRules = TIERS.slice(0, -1).map((tier, index) => ({
  name: `core-tier-${index + 1}`,
  severity: "error",
  comment: `lib/{${tier.join(",")}} lies below ${TIERS.slice(index + 1).flat().join(", ")}: move the shared part down, or hand the value in as an argument.`,
  from: { path: room(...tier) },
  to: { path: room(...TIERS.slice(index + 1).flat()) },
}));

export default {
  forbidden: [
    ...tierRules,
    {
      name: "core-is-pure",
      severity: "error",
      comment: "The core runs in the page, a worker, the server and tests alike: no React, Next, database, file or network there.",
      from: { path: "^lib/", pathNot: "^lib/(server|client)/" },
      to: { path: "^(lib/(server|client)|components|app|models|migrations|seeders|scripts)/" },
    },
    {
      name: "core-takes-no-framework",
      severity: "error",
      comment: "The core runs in the page, a worker, the server and tests alike: no React, Next, database or Node module there.",
      from: { path: "^lib/", pathNot: "^lib/(server|client)/" },
      to: { path: "node_modules/(react|react-dom|next|next-auth|reactflow|@reactflow|sequelize|pg|zustand|graphile-worker|@aws-sdk|nodemailer|radix-ui|@tanstack|comlink|idb)/" },
    },
    {
      name: "core-takes-no-node-module",
      severity: "error",
      comment: "The core also runs in a browser, which has no Node modules: hand in what is needed.",
      from: { path: "^lib/", pathNot: "^lib/(server|client)/" },
      to: { dependencyTypes: ["core"] },
    },
    {
      name: "rule-imports-no-rule",
      severity: "error",
      comment: "A rule stands alone: what two rules share is a calculation (lib/calc) or part of the engine.",
      from: { path: "^lib/rules/", pathNot: ["^lib/rules/engine/", "/index[.]ts$", "/registry[.]ts$"] },
      to: { path: "^lib/rules/", pathNot: ["^lib/rules/engine/", "/shared", "^lib/rules/families/"] },
    },
    {
      name: "server-and-client-apart",
      severity: "error",
      comment: "What only the server may know must not reach the browser: share through the core or a fetched answer.",
      from: { path: "^lib/client/" },
      to: { path: "^(lib/server|models)/", dependencyTypesNot: ["type-only"] },
    },
    {
      name: "server-knows-no-client",
      severity: "error",
      comment: "lib/server serves any client, and never needs one of ours.",
      from: { path: "^lib/server/" },
      to: { path: "^(lib/client|components|app)/" },
    },
    {
      name: "components-stay-in-the-browser",
      severity: "error",
      comment: "Components get data as properties or from route handlers; pages load it on the server and hand it in.",
      from: { path: "^components/" },
      to: { path: "^(lib/server|models|app)/", dependencyTypesNot: ["type-only"] },
    },
    {
      name: "nothing-imports-app",
      severity: "error",
      comment: "app is the top: pages and route handlers are thin, and what others need lies below them.",
      from: { path: "^(components|lib|models)/" },
      to: { path: "^app/" },
    },
    {
      name: "models-behind-data",
      severity: "error",
      comment: "Only lib/server/data knows the tables: locks, audit and permissions live there and cannot be walked around.",
      from: { pathNot: "^(lib/server/data|models|migrations|tests)/" },
      to: { path: "^models/" },
    },
    {
      name: "flow-library-in-canvas",
      severity: "error",
      comment: "Only components/diagram/canvas knows the flow library, so that the document stays ours and the library can be changed in one place.",
      from: { path: "^(app|components|lib)/", pathNot: "^components/diagram/canvas/" },
      to: { path: "node_modules/(reactflow|@reactflow)/" },
    },
    {
      name: "scripts-stay-outside",
      severity: "error",
      comment: "The product never needs its run scripts or test fakes.",
      from: { path: "^(app|components|lib|models)/" },
      to: { path: "^(scripts|tests)/" },
    },
    {
      name: "no-circle",
      severity: "error",
      comment: "Two files that need each other are one thing or three: move the shared part into a file of its own.",
      from: { path: "^(app|components|lib)/", pathNot: "^lib/server/" },
      to: { circular: true, dependencyTypesNot: ["type-only"] },
    },
    {
      name: "not-resolvable",
      severity: "error",
      comment: "The import leads nowhere.",
      from: {},
      to: { couldNotResolve: true, pathNot: "^(server-only|\\.\\./?\\.next|.*\\.css$)" },
    },
    {
      name: "no-development-package",
      severity: "error",
      comment: "The product needs it when it runs, so it belongs in dependencies.",
      from: { path: "^(app|components|lib|models|migrations|seeders)/" },
      to: { dependencyTypes: ["npm-dev"], dependencyTypesNot: ["type-only"], pathNot: "node_modules/@types/" },
    },
  ],
  options: {
    doNotFollow: { path: "node_modules" },
    exclude: { path: "\\.next|\\.css$" },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: "tsconfig.json" },
    enhancedResolveOptions: { exportsFields: ["exports"], conditionNames: ["import", "require", "node", "default", "types"], extensions: [".ts", ".tsx", ".d.ts", ".mjs", ".js", ".json"] },
  },
};
