import folderTable from "../../scripts/folders.json" with { type: "json" };
import { packageOf } from "./imports.ts";
import { fileOf, type Source } from "./sources.ts";

export interface FolderTable {
  /** Folder of src → folders it may import besides itself; `engine` stands for all of engine. */
  readonly folders: Readonly<Record<string, readonly string[]>>;
  readonly packagesOnlyIn: Readonly<Record<string, readonly string[]>>;
  /** Folders beside src whose files may be imported, → by whom. */
  readonly filesBesideSourceOnlyIn: Readonly<Record<string, readonly string[]>>;
  /** Folders that may read the clock, chance, storage and the network. */
  readonly effectsOnlyIn: readonly string[];
  /** Where the page and the terminal begin. */
  readonly entries: readonly string[];
  /** Every file of these is a beginning: other programs import them. */
  readonly entryFolders: readonly string[];
  /** Slow, obvious versions of fast code, there for the tests to compare with. */
  readonly twins: readonly string[];
}

export const table: FolderTable = folderTable;

/** Whether a file lies in one of some folders of src. */
export const isWithin = (path: string, folders: readonly string[]): boolean =>
  folders.some((folder) => path.startsWith(`src/${folder}/`));

/** The table's folder a file lies in, the deepest one. */
export function folderOf(path: string): string | undefined {
  return Object.keys(table.folders)
    .filter((folder) => isWithin(path, [folder]))
    .sort((a, b) => b.length - a.length)[0];
}

/** The imports of one file that the table does not allow, each as a line naming file, import and rule. */
export function folderFaults({ path, imports }: Pick<Source, "path" | "imports">): readonly string[] {
  const folder = folderOf(path);
  if (folder === undefined) return path.endsWith(".d.ts") ? [] : [`${path} lies in no folder of the table`];
  const allowed = [folder, ...table.folders[folder]];
  return imports.flatMap(({ specifier }) => {
    const file = fileOf(path, specifier);
    if (file === undefined) {
      const owners = table.packagesOnlyIn[packageOf(specifier) ?? ""];
      return owners && !isWithin(path, owners) ? [`${path} imports ${specifier}: only ${owners.join(", ")} may`] : [];
    }
    if (file.startsWith("src/")) {
      return isWithin(file, allowed)
        ? []
        : [`${path} imports ${file}: ${folder} may import ${allowed.slice(1).join(", ") || "nothing"}`];
    }
    const users = table.filesBesideSourceOnlyIn[file.split("/")[0]] ?? [];
    return isWithin(path, users) ? [] : [`${path} imports ${file}: only ${users.join(", ") || "nobody"} may`];
  });
}
