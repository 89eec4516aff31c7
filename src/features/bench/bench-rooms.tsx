import { Link } from 'react-router-dom';
import { paths } from '../../config/paths';

/** The rooms behind the bench, which have no place of their own at the foot. */
export function BenchRooms({ rig }: { readonly rig: string }) {
  return (
    <nav className="bench-rooms" aria-label="Behind the bench">
      <Link to={paths.people(rig)}>Hands and guests</Link>
      <Link to={paths.alignment(rig)}>Alignment</Link>
      <Link to={paths.notes()}>Notes</Link>
      <Link to={paths.desk()}>Desk</Link>
      <Link to={paths.crew()}>Crew</Link>
      <Link to={paths.handover()}>Handover</Link>
      <Link to={paths.settings()}>Settings</Link>
      <Link to={paths.signIn()}>Person</Link>
    </nav>
  );
}
