import { useState } from 'react';
import type { WorkbookIssue } from './workbookIssue';
import { Button } from '../Button';
import { faultsCsv } from './faultsCsv';

const shownAtFirst = 100;

export interface FaultTableProps {
  issues: readonly WorkbookIssue[];
  caption: string;
  /** Name of the csv file that the list is saved as; null leaves out the button. */
  saveAs?: string | null;
}

function save(issues: readonly WorkbookIssue[], fileName: string) {
  const address = URL.createObjectURL(
    new Blob([faultsCsv(issues)], { type: 'text/csv;charset=utf-8' }),
  );
  const link = document.createElement('a');
  link.href = address;
  link.download = fileName;
  link.click();
  URL.revokeObjectURL(address);
}

/** Faults or cautions of a workbook, each with its sheet and cell. */
export function FaultTable({ issues, caption, saveAs = null }: FaultTableProps) {
  const [all, setAll] = useState(false);
  const shown = all ? issues : issues.slice(0, shownAtFirst);
  return (
    <div>
      <div className="overflow-x-auto">
        <table className="stacks w-full border-collapse text-[13.5px] leading-5">
          <caption className="sr-only">{caption}</caption>
          <thead>
            <tr className="text-quiet border-rule border-b text-left text-[13px]">
              {['Sheet', 'Cell', 'Found', 'Expected', 'What to do'].map((name) => (
                <th key={name} scope="col" className="py-1.5 pr-5 font-normal whitespace-nowrap">
                  {name}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {shown.map((issue, index) => (
              <tr key={index} className="border-rule border-b align-top">
                <td className="py-1.5 pr-5 whitespace-nowrap">{issue.sheet}</td>
                <td className="py-1.5 pr-5 font-semibold tabular-nums">{issue.cell ?? '–'}</td>
                <td data-column="found" className="max-w-48 min-w-18 py-1.5 pr-5 wrap-break-word">
                  {issue.found ?? 'nothing'}
                </td>
                <td data-column="expected" className="min-w-32 py-1.5 pr-5">
                  {issue.expected}
                </td>
                <td className="whole min-w-56 py-1.5">{issue.message}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <div className="mt-3 flex flex-wrap gap-3">
        {shown.length < issues.length && (
          <Button onClick={() => setAll(true)}>Show all {issues.length}</Button>
        )}
        {saveAs && <Button onClick={() => save(issues, saveAs)}>Save list as csv</Button>}
      </div>
    </div>
  );
}
