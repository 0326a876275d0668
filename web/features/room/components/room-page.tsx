import { useState } from 'react';
import { Link } from 'react-router-dom';
import { cautions } from '#shared/cautions';
import { Button } from '../../../components/ui/button';
import { EmptyState } from '../../../components/ui/empty-state';
import { MarginPage } from '../../../components/ui/margin-page';
import { PageHead } from '../../../components/ui/page-head';
import { RunningFoot } from '../../../components/ui/running-foot';
import { paths } from '../../../lib/paths';
import { useRevision } from '../../../lib/queries/revision-query';
import { useRevisionParams } from '../../../lib/revision-params';
import { useShortcuts } from '../../../lib/shortcuts';
import { usePageTitle } from '../../../lib/use-page-title';
import { useRoom } from '../api/room-query';
import { RoomAside } from './room-aside';
import { RoomChart } from './room-chart';
import { RoomTable } from './room-table';

export function RoomPage() {
  const params = useRevisionParams();
  const revision = useRevision(params);
  const { room, earlier, startingPoint } = useRoom(params);
  const [asTable, setAsTable] = useState(false);
  usePageTitle(`Room to move, ${revision.mixDesignation} revision ${revision.number}`);
  useShortcuts([{ key: 't', label: 'table', run: () => setAsTable((now) => !now), foot: true }]);
  const back = paths.revision(params.submittalId, params.number);
  const canDraw = room !== null && room.trials.length > 1;
  return (
    <MarginPage marginWidthPx={300} aside={<RoomAside room={room} earlier={earlier} revisionPath={back} />}>
      <PageHead
        kicker={
          <Link to={back}>
            {revision.mixDesignation} revision {revision.number}
          </Link>
        }
        title="Room to move"
        rest="in binder content, at the gradation of the trials"
        lede={revision.description}
      />
      {room === null ? (
        <EmptyState title="This check has no room to move: its section chose no rules for it, or an earlier engine made it.">
          <Link to={back}>Back to the findings</Link>
        </EmptyState>
      ) : (
        <>
          {room.room === null ? <p className="room-none">{room.words.answer}</p> : null}
          {canDraw && !asTable ? <RoomChart room={room} earlier={earlier} params={params} /> : null}
          {canDraw ? (
            <div className="acts pt-2 pb-2">
              <Button kind="text" onPress={() => setAsTable(!asTable)}>
                {asTable ? 'Show as a chart' : 'Show as a table'}
              </Button>
            </div>
          ) : null}
          {asTable || !canDraw ? <RoomTable rules={room.rules} /> : null}
        </>
      )}
      <RunningFoot
        texts={startingPoint ? [cautions.startingPoint, cautions.findings] : [cautions.findings]}
      />
    </MarginPage>
  );
}
