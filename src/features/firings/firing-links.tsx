import { Link } from 'react-router-dom';
import { paths } from '../../config/paths';

/** What hangs on a firing beside its readings. */
export function FiringLinks({ firing }: { readonly firing: string }) {
  return (
    <p className="firing-links">
      <Link to={paths.traces(firing)}>Traces</Link>{' '}
      <Link to={paths.notesOf('firing', firing)}>Notes and photos</Link>
    </p>
  );
}
