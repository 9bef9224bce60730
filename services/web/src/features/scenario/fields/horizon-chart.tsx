import { makeStyles, tokens } from '@fluentui/react-components';
import { useWatch } from 'react-hook-form';
import { horizonOutline } from '../model/horizon-outline.js';

const useStyles = makeStyles({
  figure: { margin: '8px 0 0', maxWidth: '480px' },
  drawing: {
    display: 'block',
    width: '100%',
    height: '96px',
    border: `1px solid ${tokens.colorNeutralStroke2}`,
    backgroundColor: tokens.colorNeutralBackground2,
  },
  ground: { fill: tokens.colorNeutralForeground3, fillOpacity: 0.5 },
  axis: {
    display: 'flex',
    justifyContent: 'space-between',
    color: tokens.colorNeutralForeground3,
    fontSize: tokens.fontSizeBase200,
  },
});

/** The horizon as it is typed, from north over east, south and west to north; the table beside it has the figures. */
export function HorizonChart({ name }: { name: string }) {
  const styles = useStyles();
  const outline = horizonOutline(useWatch({ name }));
  if (outline === null) return null;
  const top = Math.max(10, ...outline.map(({ elevationDeg }) => elevationDeg));
  const line = outline.map(({ azimuthDeg, elevationDeg }) => `${azimuthDeg},${top - elevationDeg}`).join(' ');
  return (
    <figure className={styles.figure}>
      <svg
        className={styles.drawing}
        viewBox={`0 0 360 ${top}`}
        preserveAspectRatio="none"
        role="img"
        aria-label={`Horizon all round, 0 to ${top}° high`}
      >
        <polygon className={styles.ground} points={`0,${top} ${line} 360,${top}`} />
      </svg>
      <div className={styles.axis} aria-hidden>
        {['N', 'E', 'S', 'W', 'N'].map((direction, at) => (
          <span key={at}>{direction}</span>
        ))}
      </div>
    </figure>
  );
}
