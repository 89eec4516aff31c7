import { useState } from 'react';
import { HoldButton } from '../../components/hold-button';
import { orderText, type Order } from './kit-register';

/** Spares below their minimum, to be copied in one touch. */
export function OrderList({ orders }: { readonly orders: readonly Order[] }) {
  const [said, setSaid] = useState('');
  const copy = async (): Promise<void> => {
    try {
      await navigator.clipboard.writeText(orderText(orders));
      setSaid('Copied.');
    } catch {
      setSaid('This browser does not let the app copy: mark the lines and copy them by hand.');
    }
  };
  return (
    <section className="kit-order" aria-label="To order">
      <div className="kit-order-head">
        <h2>To order</h2>
        <HoldButton label="Copy the order" onComplete={copy} />
      </div>
      <pre>{orderText(orders)}</pre>
      <p role="status">{said}</p>
    </section>
  );
}
