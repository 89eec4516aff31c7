import { sectionFields, sectionTitle, SECTIONS } from './edit-sections';
import type { SectionStatus } from './edit-state';
import { readTyped } from './edit-units';
import { rowsOf } from './spec-texts';
import type { RigEdit } from './use-rig-edit';

/** Every section with what stands in it and how far it is: where to go is one touch away. */
export function EditOverview({ edit }: { readonly edit: RigEdit }) {
  return (
    <ol className="edit-overview">
      {SECTIONS.map((section, i) => {
        const status = edit.state.sections.find((one) => one.section === section);
        return (
          <li key={section}>
            <button type="button" onClick={() => edit.go(section)}>
              <span>
                <b>
                  {i + 1} {sectionTitle(section, edit.state.textOf)}
                </b>
                <span className="edit-summary muted">{summaryOf(edit, section)}</span>
              </span>
              <span className="edit-status">{status === undefined ? '' : statusWords(status)}</span>
            </button>
          </li>
        );
      })}
    </ol>
  );
}

export function statusWords({ open, refused, suggested, changed }: SectionStatus): string {
  if (refused > 0) return `${refused} refused`;
  if (open > 0) return `${open} open`;
  if (suggested > 0) return `${suggested} suggested`;
  return changed > 0 ? `${changed} entered` : '';
}

/** The first few values, as they stand. */
function summaryOf(edit: RigEdit, section: (typeof SECTIONS)[number]): string {
  const { textOf } = edit.state;
  if (section === 'shorting')
    return rowsOf(textOf('shorting_points'))
      .map((row) => textOf(`shorting_points.${row}`))
      .join(', ');
  const said = sectionFields(section, textOf).flatMap((field) => {
    const text = textOf(field.key).trim();
    if (text === '') return [];
    if (field.kind === 'choice') return [field.options.find((one) => one.value === text)?.label ?? text];
    if (field.kind !== 'number') return [text];
    const typed = readTyped(text);
    if (field.unit === '') return [`${typed.number} ${field.label.toLowerCase()}`];
    return [`${typed.number.replace('-', '\u2212')}\u2009${typed.unit ?? field.unit}`.trim()];
  });
  return said.join(', ');
}
