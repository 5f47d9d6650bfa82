import { duration, figure, powerOfTen } from '../format/index.ts';
import { useAppState } from '../state/index.ts';

export function StatusBar() {
  const findings = useAppState((state) => state.simulation?.findings);
  const notice = useAppState((state) => state.notice);
  const units = useAppState((state) => (state.units === 'SI' ? 'SI' : 'fields in inch-pound'));
  if (!findings) {
    return (
      <footer className="status">
        <span role="status">
          {notice ?? 'Works without the internet. Nothing leaves this computer.'}
        </span>
        <span className="right">Estimates for design. Check against local codes.</span>
        <span>{units}</span>
      </footer>
    );
  }
  const { quality, timings, weather, stepMinutes } = findings;
  const repaired = weather.repairs
    .filter((one) => one.kind === 'repair')
    .reduce((sum, one) => sum + one.count, 0);
  const closes = powerOfTen(quality.relativeBalanceResidual);
  return (
    <footer className="status">
      <span role="status">{notice}</span>
      {!notice && (
        <>
          <span>
            Year run in {duration(timings.runMs)}, {figure(stepMinutes)} min steps
          </span>
          <span>
            Heat balance closes to{' '}
            {closes ? (
              <>
                {closes.mantissa}·10<sup>{closes.exponent}</sup>
              </>
            ) : (
              'nought'
            )}
          </span>
          {quality.unconvergedSteps > 0 && (
            <span className="status-warn">
              {figure(quality.unconvergedSteps)} steps did not settle
            </span>
          )}
          <span>
            Weather: {weather.place}, {figure(weather.hours)} h, {figure(repaired)} repaired
          </span>
        </>
      )}
      <span className="right">Estimates for design. Check against local codes.</span>
      <span>{units}</span>
    </footer>
  );
}
