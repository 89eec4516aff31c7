import { HoldButton } from '../../../components/hold-button';
import { SaysBlock } from '../../../components/says-block';
import type { SheetEdit } from './use-sheet-edit';

/** What stands in the way, what is advised, and what publishing changes: all of it read before the hold. */
export function PublishBlock({ edit }: { readonly edit: SheetEdit }) {
  const { problems, changes, published, hindrance, spec } = edit;
  const whole = problems.filter((one) => one.step === null && one.weight === 'refusal');
  const advised = problems.filter((one) => one.step === null && one.weight === 'advice');
  return (
    <section aria-label="Publish" className="sheet-section">
      <h2>Publish</h2>
      {whole.map((one) => (
        <p key={one.words} className="field-refusal" role="alert">
          {one.words}
        </p>
      ))}
      {advised.map((one) => (
        <p key={one.words} className="muted">
          Advised: {one.words}
        </p>
      ))}
      {published === null ? (
        <SaysBlock muted>
          It replaces nothing. Checks can be opened on it once the server has taken it.
        </SaysBlock>
      ) : (
        <>
          <SaysBlock muted>
            It replaces version {published.version}. Checks that are open go on with the version that they
            were opened on.
          </SaysBlock>
          {spec === null || changes.length === 0 ? null : (
            <ul className="sheet-changes" aria-label={`Differs from version ${published.version}`}>
              {changes.map(({ what, before, after }) => (
                <li key={what}>
                  <b>{what}</b>
                  {before === null ? null : <del>{before === '' ? 'nothing' : before}</del>}
                  {after === null ? <span>taken out</span> : <ins>{after === '' ? 'nothing' : after}</ins>}
                </li>
              ))}
            </ul>
          )}
        </>
      )}
      <p role="status" className={hindrance === null ? '' : 'muted'}>
        {hindrance ?? 'Ready to publish.'}
      </p>
      <div className="sheet-row">
        <HoldButton
          main
          label="Hold to publish"
          hold="second"
          disabled={hindrance !== null}
          {...(hindrance === null ? {} : { reason: hindrance })}
          onComplete={edit.publish}
        />
        <button type="button" className="sheet-button" onClick={edit.leave}>
          Back, the draft stays
        </button>
        <HoldButton label="Hold to discard the draft" hold="half-second" onComplete={edit.discard} />
      </div>
    </section>
  );
}
