// Folders import one way. The table is scripts/folders.json, which test/structure/folders.test.ts reads as well.
const { folders, packagesOnlyIn } = require("./scripts/folders.json");

const within = (paths) => (paths.length === 0 ? "^(?!)" : `^src/(${paths.join("|")})/`);
const packagePath = (name) => `node_modules/(@types/)?${name}/`;

module.exports = {
  forbidden: [
    { name: "no cycles", severity: "error", from: {}, to: { circular: true } },
    ...Object.entries(folders).map(([folder, allowed]) => ({
      name: `${folder} may import ${allowed.join(", ") || "nothing"}`,
      severity: "error",
      from: { path: within([folder]) },
      to: { path: "^src/", pathNot: within([folder, ...allowed]) },
    })),
    ...Object.entries(packagesOnlyIn).map(([name, allowed]) => ({
      name: `only ${allowed.join(", ")} may import ${name}`,
      severity: "error",
      from: { path: "^src/", pathNot: within(allowed) },
      to: name === "node" ? { dependencyTypes: ["core"] } : { path: packagePath(name) },
    })),
    { name: "sources import sources", severity: "error", from: { path: "^src/" }, to: { path: "^(test|scripts|dist)/" } },
    { name: "every import is found", severity: "error", from: { path: "^src/" }, to: { couldNotResolve: true } },
  ],
  options: {
    doNotFollow: { path: "node_modules" },
    // Types count: an upward type still ties the knot.
    tsPreCompilationDeps: true,
    tsConfig: { fileName: "tsconfig.json" },
    enhancedResolveOptions: { exportsFields: ["exports"], conditionNames: ["import", "browser", "node", "default", "types"] },
  },
};
