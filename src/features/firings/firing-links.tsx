import { Link } from 'react-router-dom';
import { paths } from '../../config/paths';

/** What hangs on a firing beside its readings. */
export function FiringLinks({ firing }: { readonly firing: string }) {
  return (
    <p className="flex flex-wrap gap-x-4">
      <Link className="firing-more inline-flex items-center" to={paths.traces(firing)}>
        Traces
      </Link>
      <Link className="firing-more inline-flex items-center" to={paths.notesOf('firing', firing)}>
        Notes and photos
      </Link>
    </p>
  );
}
