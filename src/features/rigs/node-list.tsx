import { Caution } from '../../components/caution';
import type { RigSpec } from '../../domain/book/rig-spec';
import type { RigView } from './figures-view';

/** Every node that stays charged by itself, with the time that its own bleed needs. */
export function NodeList({ spec, view }: { readonly spec: RigSpec; readonly view: RigView }) {
  return (
    <section>
      <h2>Charged nodes</h2>
      {view.no_wait === null ? null : <Caution>{view.no_wait}</Caution>}
      <ol className="rig-list">
        {view.nodes.map((node, i) => (
          <li key={node.name} className="rig-between">
            <span>
              {i < spec.nodes.length ? <b>{i + 1} </b> : null}
              {node.name}
              {node.bleed_Mohm === null ? null : (
                <span className="muted nowrap">
                  {' '}
                  {node.bleed_Mohm}
                  {'\u2009'}MΩ
                </span>
              )}
            </span>
            <span className="nowrap">
              {node.computed === null ? 'no number: treat as charged' : `${node.computed}\u2009s`}
            </span>
          </li>
        ))}
      </ol>
      <p className="muted">
        Computed from the supply’s limit. Wait 60{'\u2009'}s at least, then short each by itself.
      </p>
    </section>
  );
}
