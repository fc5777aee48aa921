import type { Show } from '@/lib/contracts/tour'

/** A show's times as the wall at the venue shows them, with the zone they are told in. */
export function ShowTimes({ show }: { show: Pick<Show, 'loadInTime' | 'showTime' | 'showDayOffset' | 'zone'> }) {
  const { loadInTime, showTime, showDayOffset, zone } = show
  return (
    <>
      {loadInTime && <>load-in {loadInTime}, </>}
      {showTime ? (
        <>
          show {showTime}
          {showDayOffset > 0 && ' +1 day'}
        </>
      ) : (
        'show time not known yet'
      )}
      , {zone ? `${zone} time` : <span className="font-bold text-brass">zone not known yet</span>}
    </>
  )
}
