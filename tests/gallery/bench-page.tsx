import { AgeScale } from '../../src/components/age-scale';
import { Reading } from '../../src/components/reading';
import { ThumbDome } from '../../src/components/thumb-dome';
import { ThumbZone } from '../../src/components/thumb-zone';
import { TwoFaces } from '../../src/components/two-faces';
import { WideMark } from '../../src/components/wide-mark';
import { Frame, later } from './frame';

export function BenchPage() {
  return (
    <Frame place="bench" banner={<Banner />} thumbs={<Thumbs />}>
      <div className="grid grid-cols-[590fr_260fr] max-sm:grid-cols-1 h-full">
        <div>
          <Pin label="Gap at 1.00 bar(g): breaks between">
            <TwoFaces
              label="Between 16.7 and 24.3 kV, law 18.8"
              low="16.7"
              middle="18.8"
              high="24.3"
              unit="kV"
            />
          </Pin>
          <Pin label="Stored at the supply's limit, 25 kV and 1.5 mA" aside="0.88 J at 18.8 kV">
            <Reading value="1.56" unit="J" size="pin" />
          </Pin>
          <Pin label="Bleed from 25 kV, every node to 50 V" aside="at least; computed 12.4 s">
            <Reading value="60" unit="s" size="pin" />
          </Pin>
        </div>
        <div className="pl-7 max-sm:px-3 py-2 flex flex-col gap-4">
          <p>
            <span className="muted">Due next</span>
            <br />
            <b>Before-firing check</b>
            <br />
            <span className="muted">lapsed at make-safe, 16:04</span>
          </p>
          <p>
            <span className="muted">Last firing, 15:20</span>
            <br />
            <Reading value="1,240" unit="shots" />
            <br />
            Ada Brook, even
            <br />
            18.9 kV, 150 µJ
          </p>
          <p>
            <span className="muted">Handover, 3 h ago</span>
            <br />
            12 entries on this tablet only
          </p>
        </div>
      </div>
    </Frame>
  );
}

function Banner() {
  return (
    <div className="pt-10 pb-4 max-sm:pt-4">
      <WideMark
        state="bridged"
        title={
          <div className="flex justify-between items-baseline gap-x-4 flex-wrap text-answer max-sm:text-pin font-[660] tracking-tight leading-none">
            <span>Shorted, declared</span>
            <Reading value="14" unit="min" size="answer" />
          </div>
        }
      >
        <AgeScale age_h={14 / 60} steps={48} variant="face" />
        <p className="flex justify-between gap-x-4 flex-wrap mt-1">
          <span>Milo Venn, 16:12. Declared, not measured. No tags in.</span>
          <span className="muted">at 12 h: not known, treat as charged</span>
        </p>
      </WideMark>
    </div>
  );
}

function Pin({ label, aside, children }: { label: string; aside?: string; children: React.ReactNode }) {
  return (
    <div className="pl-8 max-sm:px-3 pt-2 pb-3 border-b border-metal min-h-27">
      <span className="muted block">{label}</span>
      <div className="flex items-baseline justify-between flex-wrap gap-x-4">
        {children}
        {aside === undefined ? null : <span className="muted">{aside}</span>}
      </div>
    </div>
  );
}

function Thumbs() {
  return (
    <ThumbZone
      label="Actions"
      main={<ThumbDome size="big" label={'Open\ncheck'} onComplete={() => undefined} />}
      others={[
        <ThumbDome
          key="hands"
          critical
          label="Hands in"
          hold="second"
          holdLabel="Hold: hands in"
          onComplete={() => later(800)}
        />,
        <ThumbDome
          key="down"
          critical
          label="Stand rig down"
          hold="second"
          holdLabel="Hold: stand Kettle down"
          onComplete={() => later(800)}
        />,
      ]}
    />
  );
}
