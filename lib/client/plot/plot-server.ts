import { callApi } from '@/lib/client/http'
import { acceptedCommandsSchema, missedCommandsSchema, plotSchema } from '@/lib/contracts/plot'
import type { MissedCommands, PlotAnswer } from '@/lib/contracts/plot'
import type { PlotCommand } from '@/plots/model/command'

/** What the plot session asks of the server. */
export interface PlotServer {
  read(): Promise<PlotAnswer>
  missed(after: number): Promise<MissedCommands>
  append(baseSequence: number, commands: readonly PlotCommand[]): Promise<{ sequence: number }>
}

export function plotServer(rigId: string): PlotServer {
  const path = `/api/rigs/${rigId}/plot`
  return {
    read: () => callApi(path, { response: plotSchema }),
    missed: (after) => callApi(`${path}/commands?after=${after}`, { response: missedCommandsSchema }),
    append: (baseSequence, commands) =>
      callApi(`${path}/commands`, {
        method: 'POST',
        body: { baseSequence, commands },
        response: acceptedCommandsSchema,
      }),
  }
}
