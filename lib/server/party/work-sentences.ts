import type { DayKind } from '@/lib/contracts/tour'
import { dayKindWords } from '@/lib/contracts/tour'
import { dateWords } from '@/lib/staging/calendar'
import type { Told } from './told'

/** The words before a name, or nothing where no name is known. */
const after = (words: string, name: string) => (name ? ` ${words} ${name}` : '')
/** Whose advance it was: a show's venue or a hire's supplier. */
const whose = ({ named }: Told) => named('showId') || named('hireId')
const countOf = (number: string, one: string, many: string) =>
  number === '1' ? `1 ${one}` : `${number || 'some'} ${many}`
const day = (date: string) => (date ? dateWords(date) : 'a day')
const kind = (words: string) => dayKindWords[words as DayKind] ?? words
/** From one name to another, or just the name where it stayed. */
const renamed = (was: string, is: string, where = '') =>
  was && is && was !== is ? `${was}${where}, now called ${is}` : `${is || was}${where}`
/** A few names are told, more are counted. */
const parts = (names: unknown) =>
  Array.isArray(names) ? (names.length > 3 ? `${names.length} parts` : names.map(String).join(', ')) : ''
const linkKind = ({ text }: Told) => (text('purpose') === 'bench' ? 'bench link' : 'reply link')
const pairWords = ({ text }: Told) => `${text('name')}: ${text('reading')} at a tap of ${text('tapHz')} Hz`
const channelName = (number: string, name: string) => `channel ${number}${name ? `, ${name},` : ''}`

const commandWords: Record<string, string> = {
  place: 'pieces put on',
  remove: 'pieces taken off',
  move: 'moved',
  rotate: 'turned',
  edit: 'particulars',
  aim: 'microphones aimed',
  setStage: 'stage size',
}

/** The sentences of the work itself: run, kit, plot, patch, revisions, advance, bench, directory. */
export const workSentences: Record<string, (told: Told) => string> = {
  'tour.added': ({ text }) => `made the tour ${text('name')}, ${day(text('firstDate'))} to ${day(text('lastDate'))}`,
  'tour.changed': ({ text }) => `renamed the tour ${text('from')} to ${text('to')}`,
  'tour.removed': ({ text }) => `took the tour ${text('was.name')} away`,
  'rig.added': ({ text }) => `added the rig ${text('name')}`,
  'rig.changed': ({ text }) => `changed the rig ${renamed(text('from.name'), text('to.name'))}`,
  'days.added': ({ text }) =>
    `put ${countOf(text('made'), 'day', 'days')} on the run, ${day(text('firstDate'))} to ${day(text('lastDate'))}`,
  'day.changed': ({ text }) =>
    `changed ${day(text('from.date'))} from ${kind(text('from.kind'))} to ${kind(text('to.kind'))}`,
  'day.removed': ({ text }) => `took ${day(text('was.date'))} off the run`,
  'show.added': ({ itself, text }) => `put ${itself || text('name') || 'a show'} on the run`,
  'show.changed': ({ itself, text }) => `changed the show at ${itself || text('from.venueName')}`,
  'show.removed': ({ text }) => `took ${text('was.venueName') || 'a show'} off the run`,
  'hire.added': (told) => `added the hire${after('from', told.named('supplierId'))}`,
  'hire.changed': ({ itself }) => `changed the hire${after('from', itself)}`,
  'hire.removed': ({ text }) => `took the hire${after('from', text('was.supplierName'))} away`,
  'kit.added': (told) =>
    `added ${told.text('name') || parts(told.detail['names']) || 'a part'} to the kit${after('of', told.named('rigId') || told.itself)}`,
  'kit.changed': ({ text }) => `changed ${renamed(text('from.name'), text('to.name'), ' in the kit')}`,
  'kit.removed': ({ text, named }) => `took ${text('name')} out of the kit${after('of', named('rigId'))}`,
  'kit.restored': ({ text, named }) => `put ${text('name')} back into the kit${after('of', named('rigId'))}`,
  'kit.ordered': ({ itself }) => `changed the order of the kit${after('of', itself)}`,
  'kit.copied': (told) => `copied the kit${after('of', told.named('fromRigId'))}${after('to', told.itself)}`,
  'kit.notes-set': ({ itself, detail }) => {
    const notes = detail['notes']
    const drums = countOf(String(Array.isArray(notes) ? notes.length : ''), 'drum', 'drums')
    return `set the notes of ${drums}${after('in the kit of', itself)}`
  },
  'note-template.added': ({ text }) => `made the note template ${text('name')}`,
  'note-template.changed': ({ text }) => `changed the note template ${renamed(text('from.name'), text('to.name'))}`,
  'note-template.removed': ({ text }) => `took the note template ${text('was.name')} away`,
  'gauge.added': ({ text }) => `added the gauge ${text('name')}`,
  'gauge.changed': ({ text }) => `changed the gauge ${renamed(text('from.name'), text('to.name'))}`,
  'gauge.removed': ({ text }) => `took the gauge ${text('name')} away`,
  'gauge.restored': ({ text }) => `put the gauge ${text('name')} back`,
  'gauge.chosen': ({ text }) =>
    text('to') ? `made ${text('to')} the tour's gauge` : `left the tour without a gauge${after('after', text('from'))}`,
  'gauge.pair-added': (told) => `added a pair to the gauge ${pairWords(told)}`,
  'gauge.pair-struck': (told) => `struck a pair of the gauge ${pairWords(told)}`,
  'gauge.pair-restored': (told) => `let a struck pair count again at the gauge ${pairWords(told)}`,
  'plot.changed': ({ itself, detail }) => {
    const commands = detail['commands']
    const words = Array.isArray(commands)
      ? commands.map((type) => commandWords[String(type)] ?? String(type)).join(', ')
      : ''
    return `changed the plot${after('of', itself)}${words ? `: ${words}` : ''}`
  },
  'channel.added': ({ text, named }) =>
    `put ${channelName(text('number'), text('name'))} on the patch${after('of', named('rigId'))}`,
  'channel.changed': ({ text, named }) =>
    `changed ${channelName(text('from.number'), text('to.name'))} on the patch${after('of', named('from.rigId'))}`,
  'channel.removed': ({ text, named }) =>
    `took ${channelName(text('was.number'), text('was.name'))} off the patch${after('of', named('was.rigId'))}`,
  'revision.issue': ({ text, named }) =>
    `issued revision ${text('number')}${after('of', named('rigId'))}, ${countOf(text('lines'), 'line', 'lines')}`,
  'pack.make': (told) => `made the pack of revision ${told.text('number')}${after('for', whose(told))}`,
  'dispatch.send': (told) => {
    const held = Number(told.text('holdSeconds')) > 0 ? `, held back for ${told.text('holdSeconds')} seconds` : ''
    return `sent revision ${told.text('number')}${after('to', told.named('contactId') || whose(told))}${held}`
  },
  'dispatch.stop': () => 'stopped a sending before it went out',
  'link.print': (told) => `printed the ${linkKind(told)}${told.itself && `: ${told.itself}`}`,
  'link.withdraw': (told) => `withdrew the ${linkKind(told)}${told.itself && `: ${told.itself}`}`,
  'link.fresh': ({ itself }) => `was mailed a fresh link${after('for', itself)}`,
  'answer.give': (told) => `answered a line${after('of', whose(told))}`,
  'answer.close': (told) => `said that this is all${after('from', whose(told))}`,
  'answer.take-down': (told) => `took down an answer${after('of', whose(told))}`,
  'answer.accept': (told) => `settled a line${after('of', whose(told))}`,
  'answer.reopen': (told) => `asked again about a line${after('of', whose(told))}`,
  'bench.read': (told) =>
    `logged ${countOf(told.text('readings'), 'reading', 'readings')}${after('of', told.allNamed('entryIds'))}${after('at', told.itself)}`,
  'bench.sign-off': (told) =>
    `signed off ${told.named('entryId') || 'a drum'}${after('at', told.itself)} as ${told.text('name')}`,
  'bench.take-back': (told) =>
    `took back the sign-off of ${told.named('entryId') || 'a drum'}${after('at', told.itself)}`,
  'venue.added': ({ text }) => `added the venue ${text('name')}`,
  'venue.changed': ({ text }) => `changed the venue ${renamed(text('from.name'), text('to.name'))}`,
  'venue.removed': ({ text }) => `took the venue ${text('was.name')} out of the directory`,
  'stage.added': ({ text, named }) => `added the stage ${text('name')}${after('to', named('venueId'))}`,
  'stage.changed': ({ text }) => `changed the stage ${renamed(text('from.name'), text('to.name'))}`,
  'stage.removed': ({ text }) => `took the stage ${text('was.name')} away`,
  'supplier.added': ({ text }) => `added the supplier ${text('name')}`,
  'supplier.changed': ({ text }) => `changed the supplier ${renamed(text('from.name'), text('to.name'))}`,
  'supplier.removed': ({ text }) => `took the supplier ${text('was.name')} out of the directory`,
  'player.added': ({ itself }) => `added the player${itself && ` ${itself}`}`,
  'player.changed': ({ itself }) => `changed the player${itself && ` ${itself}`}`,
  'player.removed': () => 'took a player out of the directory',
  'contact.added': ({ itself, named }) =>
    `added the contact${itself && ` ${itself}`}${after('to', named('venueId') || named('supplierId'))}`,
  'contact.changed': ({ itself }) => `changed the contact${itself && ` ${itself}`}`,
  'contact.removed': () => 'took a contact out of the directory',
}
