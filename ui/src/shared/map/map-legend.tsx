import { formatNumber } from '../number/format';
import { useColourMode } from '../theme/colour-mode';
import { gradient, ramps, type RampName } from '../theme/ramps';
import { siteDiameterPx } from './map-option';
import './map.css';

type Props = {
  /** False where nothing is coloured: sites alone. */
  showRamp?: boolean;
  ramp: RampName;
  limit: number;
  floor: number;
  hatchMeans?: string;
  showHatch: boolean;
  onHatch: (on: boolean) => void;
  hasSites: boolean;
  showSites: boolean;
  onSites: (on: boolean) => void;
};

const siteSteps = [3, 30, 120];

/** The key to the colours; hatching and sites can be taken off the map with their keys. */
export function MapLegend(props: Props) {
  const { mode } = useColourMode();
  const { ramp, limit, floor } = props;
  return (
    <>
      {props.showRamp !== false && (
        <div
          className="map-bar"
          role="img"
          aria-label={`Colours from ${tickTexts(ramp, limit, floor).join(' to ')}`}
        >
          <div style={{ background: gradient(ramps[ramp][mode]) }} />
          <div>
            {tickTexts(ramp, limit, floor).map((text) => (
              <span key={text}>{text}</span>
            ))}
          </div>
        </div>
      )}
      {props.hatchMeans && (
        <button
          type="button"
          className="map-key"
          aria-pressed={props.showHatch}
          onClick={() => props.onHatch(!props.showHatch)}
        >
          <i className="map-hatch" />
          {props.hatchMeans}
        </button>
      )}
      {props.hasSites && (
        <button
          type="button"
          className="map-key"
          aria-pressed={props.showSites}
          onClick={() => props.onSites(!props.showSites)}
        >
          <span className="map-dots">
            {siteSteps.map((count) => (
              <i key={count} style={{ width: siteDiameterPx(count), height: siteDiameterPx(count) }} />
            ))}
          </span>
          sites: {siteSteps.join(', ')} samples
        </button>
      )}
    </>
  );
}

function tickTexts(ramp: RampName, limit: number, floor: number): string[] {
  if (ramp === 'forcing') {
    return [-1, -0.5, 0, 0.5, 1].map((share) =>
      share === 0 ? '0' : formatNumber(share * limit, { decimals: decimalsOf(limit / 2), signed: true }),
    );
  }
  const middle = Math.sqrt(limit * floor);
  return [floor, middle, limit].map((value) => formatNumber(value, { figures: 1 }));
}

const decimalsOf = (value: number) => String(Number(value.toPrecision(3))).split('.')[1]?.length ?? 0;
