import type { ReadableEntry } from '../book/read-body';

/** Entry ids that an entry names beside its subject, plus the subject itself. */
export function namedIds(entry: ReadableEntry): readonly string[] {
  return entry.meta.subject === entry.meta.id ? idsInBody(entry) : [entry.meta.subject, ...idsInBody(entry)];
}

function idsInBody(entry: ReadableEntry): readonly string[] {
  switch (entry.kind) {
    case 'rig.revised':
      return [entry.body.based_on];
    case 'rig.stand-down-retracted':
      return [entry.body.stand_down];
    case 'rig.returned':
      return entry.body.lifts;
    case 'hands.out':
      return [entry.body.tag];
    case 'guest.out':
      return [entry.body.guest];
    case 'part.fitted':
      return entry.body.replaces === null ? [] : [entry.body.replaces];
    case 'part.retired':
      return [entry.body.part];
    case 'alignment.measured':
    case 'alignment.arc-seen':
      return [entry.body.rig_revision];
    case 'alignment.adjusted':
      return [entry.body.rig_revision, entry.body.based_on].filter((id) => id !== null);
    case 'kit.issued':
      return [entry.body.to.id];
    case 'note.written':
    case 'photo.attached':
      return [entry.body.about.id];
    case 'note.amended':
      return [entry.body.based_on];
    case 'trace.attached':
      return [entry.body.about.id, entry.body.reading].filter((id) => id !== null);
    case 'check.step-done':
      return entry.body.kit ?? [];
    case 'permit.asked':
    case 'permit.granted':
      return [entry.body.rig_revision];
    case 'permit.withdrawn':
      return [entry.body.permit];
    case 'parting.settled':
      return entry.body.settles;
    case 'sheet.published':
      return entry.body.replaces === null ? [] : [entry.body.replaces];
    case 'check.opened':
      return [entry.body.rig_revision, entry.body.sheet];
    case 'firing.opened':
      return [entry.body.rig_revision, entry.body.check, entry.body.permit].filter((id) => id !== null);
    case 'person.authorisation-ended':
      return [entry.body.authorisation];
    case 'entry.corrected':
      return [entry.body.corrects];
    case 'entry.struck':
      return [entry.body.strikes];
    case 'entry.adopted':
      return entry.body.adopts;
    case 'entry.claimed':
      return [entry.body.claims];
    default:
      return [];
  }
}
