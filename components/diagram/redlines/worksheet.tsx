import type { Step } from "@/lib/calc/types";

const shown = (step: Step): string => {
  const result = typeof step.result === "number" ? `${Number(step.result.toFixed(2))}${step.unit ? ` ${step.unit}` : ""}` : step.result;
  return step.substituted && step.substituted !== result ? `${step.substituted} = ${result}` : result;
};

/** Worked steps, one line each: what, with numbers and units, the table at the right edge, the last result boxed. */
export function Worksheet({ steps, result }: { steps: readonly Step[]; result?: string }) {
  if (steps.length === 0) return null;
  return (
    <div className="stretch-schedule">
      <table className="w-full border-collapse text-label leading-tight">
        <caption className="sr-only">Worked steps</caption>
        <tbody>
          {steps.map((step, index) => (
            <tr key={index} className="border-b border-dotted border-hatch align-top">
              <th scope="row" className="py-1 pr-2 text-left font-normal text-ink2" title={step.expression}>{step.symbol}</th>
              <td className="py-1 pr-1.5 font-strong" title={step.expression}>{shown(step)}</td>
              <td className="py-1 text-right text-small text-ink3">{step.citation}</td>
            </tr>
          ))}
        </tbody>
      </table>
      {result && <p className="mt-2 inline-block border-[1.5px] border-ink bg-paper px-2 py-1 text-text font-finding stretch-label">{result}</p>}
    </div>
  );
}
