import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import ts from "typescript";

const APP = path.join(process.cwd(), "app");
const METHODS = new Set(["GET", "HEAD", "POST", "PUT", "PATCH", "DELETE", "OPTIONS"]);

export interface Listed {
  readonly pages: readonly string[];
  readonly routes: readonly string[];
  readonly actions: readonly string[];
  /** Files by which Next.js serves something that this list does not know how to name. */
  readonly others: readonly string[];
}

export function listFiles(folder: string): string[] {
  return readdirSync(folder, { recursive: true, encoding: "utf8" })
    .map((file) => file.split(path.sep).join("/"))
    .sort();
}

/** Names that a module gives to the outside. */
export function listExports(file: string, source = readFileSync(file, "utf8")): string[] {
  const parsed = ts.createSourceFile(file, source, ts.ScriptTarget.Latest, true);
  return parsed.statements.flatMap((statement): string[] => {
    if (ts.isExportDeclaration(statement)) {
      const { exportClause } = statement;
      if (exportClause && ts.isNamedExports(exportClause)) return exportClause.elements.map((one) => one.name.text);
      return ["*"];
    }
    if (ts.isExportAssignment(statement)) return ["default"];
    const isExported =
      ts.canHaveModifiers(statement) &&
      ts.getModifiers(statement)?.some((one) => one.kind === ts.SyntaxKind.ExportKeyword);
    if (!isExported) return [];
    if (ts.isVariableStatement(statement)) {
      return statement.declarationList.declarations.map((one) => one.name.getText(parsed));
    }
    if (ts.isFunctionDeclaration(statement)) return [statement.name?.text ?? "default"];
    return [];
  });
}

/** "(app)/trips/[tripId]/(overview)/page.tsx" → "/trips/[tripId]". */
function toPath(file: string): string {
  const parts = path.posix.dirname(file).split("/");
  return `/${parts.filter((part) => part !== "." && !/^\(.*\)$/.test(part)).join("/")}`;
}

const SPECIAL = /(^|\/)(robots|sitemap|manifest|favicon|icon|apple-icon|opengraph-image|twitter-image)\d*\.\w+$/;

export function listRoutes(folder = APP): Listed {
  const files = listFiles(folder);
  const routes = files
    .filter((file) => /(^|\/)route\.[jt]sx?$/.test(file))
    .flatMap((file) =>
      listExports(path.join(folder, file))
        .filter((name) => METHODS.has(name))
        .map((method) => `${method} ${toPath(file)}`),
    );
  const actions = files
    .filter((file) => /(^|\/)actions\.tsx?$/.test(file))
    .flatMap((file) => {
      const at = path.posix.dirname(file).replace(/^\(app\)\//, "");
      return listExports(path.join(folder, file)).map((name) => `${at}#${name}`);
    });
  return {
    pages: files.filter((file) => /(^|\/)page\.(tsx?|jsx?|mdx?)$/.test(file)).map(toPath),
    routes,
    actions,
    others: files.filter((file) => SPECIAL.test(file)),
  };
}
