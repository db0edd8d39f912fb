import { useId } from 'react';
import type { PhaseNames } from '../phasor/phasorWords.ts';
import type { WavePhases, WaveSettings } from './waveModel.ts';

interface WaveToolsProps {
  settings: WaveSettings;
  maxOrder: number;
  names: PhaseNames;
  onSettings(settings: WaveSettings): void;
}

/** Choice of orders, periods and phases of a waveform. */
export function WaveTools({ settings, maxOrder, names, onSettings }: WaveToolsProps) {
  const ordersId = useId();
  const { content } = settings;
  const kind = typeof content === 'string' ? content : 'upTo';
  const setKind = (next: string) =>
    onSettings({
      ...settings,
      content: next === 'upTo' ? { upTo: Math.min(25, maxOrder) } : next === 'all' ? 'all' : 'fundamental',
    });
  return (
    <div className="chart-tools">
      <label>
        orders{' '}
        <select value={kind} onChange={(event) => setKind(event.target.value)}>
          <option value="fundamental">fundamental</option>
          <option value="upTo">up to order</option>
          <option value="all">all</option>
        </select>
      </label>
      {typeof content === 'object' && (
        <label htmlFor={ordersId}>
          N{' '}
          <input
            id={ordersId}
            type="number"
            min={1}
            max={maxOrder}
            value={content.upTo}
            onChange={(event) => {
              const upTo = Math.round(event.target.valueAsNumber);
              if (upTo >= 1 && upTo <= maxOrder) onSettings({ ...settings, content: { upTo } });
            }}
          />
        </label>
      )}
      <label>
        periods{' '}
        <select
          value={settings.periods}
          onChange={(event) => onSettings({ ...settings, periods: event.target.value === '2' ? 2 : 1 })}
        >
          <option value={1}>1</option>
          <option value={2}>2</option>
        </select>
      </label>
      <label>
        phases{' '}
        <select
          value={settings.phases}
          onChange={(event) => onSettings({ ...settings, phases: phasesFrom(event.target.value) })}
        >
          <option value="all">all three</option>
          <option value="L1">{names[0]}</option>
          <option value="L2">{names[1]}</option>
          <option value="L3">{names[2]}</option>
        </select>
      </label>
    </div>
  );
}

function phasesFrom(text: string): WavePhases {
  return text === 'L1' || text === 'L2' || text === 'L3' ? text : 'all';
}
