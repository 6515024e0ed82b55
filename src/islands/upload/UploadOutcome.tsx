import { useEffect, useRef } from 'react';
import type { UploadAnswer } from '../../contracts/screens';
import type { ApiError } from '../api';
import { buttonLook } from '../Button';
import { ErrorNote } from '../ErrorNote';
import { FaultTable } from './FaultTable';
import { faultsIn } from './sendWorkbook';

/** What was stored, or that it was there already, with its cautions. */
export function UploadDone({ answer }: { answer: UploadAnswer }) {
  const heading = useRef<HTMLHeadingElement>(null);
  useEffect(() => heading.current?.focus(), []);
  const { screen, cautions, alreadyImported, href } = answer;
  return (
    <section className="space-y-4">
      <h2 ref={heading} tabIndex={-1} className="text-[18px] font-semibold outline-none">
        {alreadyImported ? 'This workbook is here already' : `${screen.name} is stored`}
      </h2>
      <p>
        {alreadyImported
          ? `It was uploaded by ${screen.uploadedBy} as ${screen.name}; nothing was stored again.`
          : `${screen.plates} ${screen.plates === 1 ? 'plate' : 'plates'}, ${screen.wells} wells, ${screen.readings} readings.`}
      </p>
      <p>
        <a href={href} className={buttonLook('main')}>
          Go to the screen
        </a>
      </p>
      {cautions.length > 0 && !alreadyImported && (
        <div>
          <h3 className="text-warning mb-1 font-semibold">
            {cautions.length === 1 ? 'One thing' : `${cautions.length} things`} to look at
          </h3>
          <FaultTable issues={cautions} caption="Cautions" />
        </div>
      )}
    </section>
  );
}

/** Why nothing was stored: the workbook's faults one by one, or what else went wrong. */
export function UploadRefused({ error, fileName }: { error: ApiError; fileName: string }) {
  const issues = faultsIn(error);
  const stops = issues.filter(({ severity }) => severity === 'stop');
  if (stops.length === 0) return <ErrorNote error={error} />;
  return (
    <section className="space-y-3">
      <div role="alert" className="border-refusal border-l-2 py-1 pl-4">
        <h2 className="text-refusal font-semibold">
          {stops.length === 1 ? 'One fault' : `${stops.length} faults`}; nothing was stored
        </h2>
        <p>
          Mend {stops.length === 1 ? 'it' : 'them'} in {fileName} and upload it again.
        </p>
      </div>
      <FaultTable
        issues={stops}
        caption={`Faults in ${fileName}`}
        saveAs={`faults-in-${fileName.replace(/\.[^.]+$/, '')}.csv`}
      />
    </section>
  );
}
