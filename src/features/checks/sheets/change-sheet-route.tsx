import { useParams } from 'react-router-dom';
import { useSheet } from '../../../data/use-book';
import type { SheetDoc } from '../../../domain/book/documents/sheet';
import { useMay } from '../use-may';
import { NotYours } from './new-sheet-route';
import { SheetEditor } from './sheet-editor';
import { NoSheet } from './sheet-route';
import { useSheetEdit } from './use-sheet-edit';
import '../checks.css';
import './sheets.css';

/** The next version of a published sheet. */
export function ChangeSheetRoute() {
  const { sheet: id = '' } = useParams();
  const sheet = useSheet(id);
  const may = useMay();
  if (sheet === undefined) return <NoSheet />;
  return may('sheet.published') ? <ChangeSheet key={sheet.id} sheet={sheet} /> : <NotYours />;
}

function ChangeSheet({ sheet }: { readonly sheet: SheetDoc }) {
  return <SheetEditor edit={useSheetEdit(sheet)} />;
}
