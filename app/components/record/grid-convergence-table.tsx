import { formatError } from "@/app/components/ui/figures";
import type { Study } from "@/benchmarks/scoring/result";

/** The grid convergence index of the functional beside its true error. */
export function GridConvergenceTable({ study }: { study: Study | null }) {
  const found = study?.gridConvergence;
  if (!found) return null;
  const figure = (value: number | null) => (value === null ? "undefined" : formatError(value, 3));
  const covered = found.isCovered === null ? "" : found.isCovered ? ", covered" : ", not covered";
  return (
    <>
      <h3 className="mt-7 mb-2">Grid convergence index</h3>
      <table className="kv text-14">
        <tbody>
          <tr>
            <th scope="row">Apparent order of the functional, three finest grids</th>
            <td>{found.order === null ? "undefined" : found.order.toFixed(2)}</td>
          </tr>
          <tr>
            <th scope="row">Index on the finest grid</th>
            <td>{figure(found.index)}</td>
          </tr>
          <tr>
            <th scope="row">True error, from the exact functional</th>
            <td>
              {figure(found.trueError)}
              {covered}
            </td>
          </tr>
        </tbody>
      </table>
    </>
  );
}
