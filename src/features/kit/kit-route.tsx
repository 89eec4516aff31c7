import { useMemo } from 'react';
import { useNavigate } from 'react-router-dom';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { paths } from '../../config/paths';
import { useKit, useLab, useRigs } from '../../data/use-book';
import { useNow } from '../../data/use-now';
import type { KitDoc } from '../../domain/book/documents/kit';
import { KIT_TYPE_WORDS } from '../../domain/report/kit-words';
import { EyewearTable } from './eyewear-table';
import { useHolderWords } from './holder-words';
import { kitGroups, ordersOf, registerWords } from './kit-register';
import { KitRow } from './kit-row';
import { OrderList } from './order-list';
import './kit.css';

/** The register: what there is, who has it, and what is due. */
export function KitRoute() {
  const kit = useKit();
  const navigate = useNavigate();
  return (
    <Screen
      thumbs={
        <ThumbZone
          label="Actions"
          main={
            <ThumbDome
              size="big"
              label={'Add\nto the register'}
              onComplete={() => void navigate(paths.kitAdd())}
            />
          }
        />
      }
    >
      <div className="kit">
        {kit.length === 0 ? (
          <>
            <h1>Kit</h1>
            <SaysBlock lead="The register is empty.">
              Add eyewear, sticks, meters, valves, cylinders, keys and spares, so that what is due is said in
              time.
            </SaysBlock>
          </>
        ) : (
          <Register kit={kit} />
        )}
      </div>
    </Screen>
  );
}

function Register({ kit }: { readonly kit: readonly KitDoc[] }) {
  const { best_ms } = useNow(60_000);
  const zone = useLab()?.settings.zone ?? 'Etc/UTC';
  const rigs = useRigs();
  const holderWords = useHolderWords();
  const groups = useMemo(() => kitGroups(kit), [kit]);
  const orders = ordersOf(kit);
  const standing = registerWords(kit, best_ms);
  return (
    <>
      <div className="kit-head">
        <h1>Kit</h1>
        <p className={standing === '' ? 'muted' : ''}>
          {standing === '' ? `${kit.length} pieces, nothing due` : standing}
        </p>
      </div>
      {orders.length === 0 ? null : <OrderList orders={orders} />}
      {groups.map((group) => (
        <section key={group.type} aria-label={KIT_TYPE_WORDS[group.type].many}>
          <h2>{KIT_TYPE_WORDS[group.type].many}</h2>
          <ul>
            {group.kit.map((one) => (
              <li key={one.id}>
                <KitRow kit={one} holder={holderWords(one.holder)} now_ms={best_ms} zone={zone} />
              </li>
            ))}
          </ul>
          {group.type === 'eyewear' ? <EyewearTable rigs={rigs} kit={kit} now_ms={best_ms} /> : null}
        </section>
      ))}
    </>
  );
}
