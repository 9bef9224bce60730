import { Button, makeStyles, tokens } from '@fluentui/react-components';
import { TableRegular } from '@fluentui/react-icons';
import type { Data, Layout, PlotRelayoutEvent } from 'plotly.js';
import { Component, lazy, Suspense, useId, useMemo, useState, type ReactNode } from 'react';
import { ErrorState } from '../components/error-state.js';
import { LoadingState } from '../components/loading-state.js';
import { useMeaningColours } from '../theme/colours.js';
import { baseLayout, chartConfig, mergeLayout, requireSvg } from './chart-layout.js';

const LazyPlotly = lazy(async () => ({ default: (await import('./plotly.js')).PlotlyChart }));

const useStyles = makeStyles({
  root: { margin: 0, minWidth: 0 },
  canvas: {
    backgroundColor: tokens.colorNeutralBackground1,
    border: `1px solid ${tokens.colorNeutralStroke2}`,
    borderRadius: tokens.borderRadiusMedium,
    overflow: 'hidden',
    // Plotly sizes itself to this box, never the box to it.
    width: '100%',
  },
  below: {
    display: 'flex',
    flexWrap: 'wrap',
    alignItems: 'center',
    justifyContent: 'space-between',
    gap: '4px 16px',
    padding: '4px 0 8px',
  },
  caption: { color: tokens.colorNeutralForeground3, fontSize: tokens.fontSizeBase200 },
});

interface PlotProps {
  /** What is drawn, for the table's caption and for readers who do not see it: "Monthly heat by scenario". */
  title: string;
  /** What can be seen in it, in a sentence; stands below the chart. */
  description: string;
  traces: readonly Data[];
  layout?: Partial<Layout>;
  /** [px] */
  height?: number;
  /** The same figures as a table (NumberTable): shown at a press, always the way for a screen reader. */
  table: ReactNode;
  onRelayout?: (event: PlotRelayoutEvent) => void;
}

/**
 * A chart in the app's colours with its figures as a table behind it. Zoom survives redrawing
 * (`uirevision`); the chart library comes with the first chart.
 */
export function Plot({ title, description, traces, layout, height = 320, table, onRelayout }: PlotProps) {
  const styles = useStyles();
  const colours = useMeaningColours();
  const tableId = useId();
  const [tableShown, setTableShown] = useState(false);
  const data = useMemo(() => {
    requireSvg(traces);
    return [...traces];
  }, [traces]);
  const fullLayout = useMemo(
    () => ({ ...mergeLayout(baseLayout(colours, height), layout ?? {}), uirevision: 'constant' }),
    [colours, height, layout],
  );
  return (
    <figure className={styles.root}>
      <div className={styles.canvas} style={{ height }} role="img" aria-label={`${title}. ${description}`}>
        <ChartBoundary title={title}>
          <Suspense fallback={<LoadingState label="Loading the chart" height={height} />}>
            <LazyPlotly
              data={data}
              layout={fullLayout}
              config={chartConfig}
              useResizeHandler
              style={{ width: '100%', height }}
              onRelayout={onRelayout}
            />
          </Suspense>
        </ChartBoundary>
      </div>
      <div className={styles.below}>
        <figcaption className={styles.caption}>{description}</figcaption>
        <Button
          size="small"
          appearance="subtle"
          icon={<TableRegular />}
          aria-expanded={tableShown}
          aria-controls={tableId}
          onClick={() => {
            setTableShown(!tableShown);
          }}
        >
          {tableShown ? 'Hide the figures' : 'Show the figures'}
        </Button>
      </div>
      <div id={tableId}>{tableShown && table}</div>
    </figure>
  );
}

/** A chart that cannot be drawn must not take the page with it: its table still stands. */
class ChartBoundary extends Component<{ title: string; children: ReactNode }, { error: Error | null }> {
  override state: { error: Error | null } = { error: null };

  static getDerivedStateFromError(error: Error) {
    return { error };
  }

  override render() {
    if (this.state.error === null) return this.props.children;
    return (
      <ErrorState what={`The chart "${this.props.title}" could not be drawn.`} error={this.state.error} />
    );
  }
}
