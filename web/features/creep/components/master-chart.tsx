import type { MasterCurveView } from '#shared/contracts/creep';
import { formatPlain, formatSigned } from '#shared/format/numbers';
import { useMediaQuery } from '../../../lib/use-media-query';
import { creepGeometry } from '../lib/creep-geometry';
import { shiftedPoints } from '../lib/shifted-points';
import { FittedCurve, LogFrame } from './log-frame';
import { SpecimenShape } from './specimen-shape';

const wide = { widthPx: 1040, heightPx: 480 };
const narrow = { widthPx: 358, heightPx: 380 };

/** All temperatures on one curve, at the reference temperature. */
export function MasterChart({ master, showBand }: { master: MasterCurveView; showBand: boolean }) {
  const size = useMediaQuery('screen and (max-width: 759px)') ? narrow : wide;
  const { shifts, referenceTemperature, fit } = master;
  const points = shiftedPoints(master);
  const geometry = creepGeometry({
    points: points.map(({ reducedTime: time, value, specimen }) => ({ time, value, specimen })),
    fit,
    findings: [],
    size,
  });
  const temperatures = shifts.map(({ temperature }) => temperature);
  return (
    <figure className="creep-figure">
      <svg
        className="chart creep-chart"
        viewBox={`0 0 ${size.widthPx} ${size.heightPx}`}
        role="img"
        aria-label={`Master curve of ${temperatures.length} temperatures at ${degrees(referenceTemperature)}; the shifts stand in the table below`}
      >
        <LogFrame geometry={geometry} timeLabel={`loading time at ${degrees(referenceTemperature)}, s`} />
        <FittedCurve geometry={geometry} showBand={showBand} />
        {points.map(({ reducedTime, value, temperature, specimen, stress, time }) => (
          <SpecimenShape
            key={`${temperature} ${specimen} ${stress} ${time} ${value}`}
            index={temperatures.indexOf(temperature ?? referenceTemperature)}
            x={geometry.x(reducedTime)}
            y={geometry.y(value)}
          />
        ))}
      </svg>
      <figcaption className="creep-legend">
        {temperatures.map((temperature, index) => (
          <span key={temperature}>
            <svg className="creep-key" viewBox="0 0 14 14" aria-hidden="true">
              <SpecimenShape index={index} x={7} y={7} />
            </svg>
            {degrees(temperature)}
          </span>
        ))}
      </figcaption>
    </figure>
  );
}

/** log aT of each temperature with its interval. */
export function ShiftTable({ master: { shifts, referenceTemperature } }: { master: MasterCurveView }) {
  return (
    <table className="table table-head-over creep-shifts">
      <caption className="hidden-text">Shift factors</caption>
      <thead>
        <tr>
          <th scope="col">Temperature</th>
          <th scope="col" className="number">
            log aT
          </th>
          <th scope="col" className="number">
            95 % interval
          </th>
        </tr>
      </thead>
      <tbody>
        {shifts.map(({ temperature, logShift, low, high }) => (
          <tr key={temperature}>
            <th scope="row">{degrees(temperature)}</th>
            <td className="number">
              {temperature === referenceTemperature ? 'reference' : formatSigned(logShift, 2)}
            </td>
            <td className="number">
              {temperature === referenceTemperature
                ? ''
                : low === null || high === null
                  ? 'not held'
                  : `${formatSigned(low, 2)} to ${formatSigned(high, 2)}`}
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function degrees(temperature: number): string {
  return `${formatPlain(temperature)} °C`;
}
