/** Verbs that begin an instruction whatever follows them: they are hardly ever nouns or adjectives. */
export const plainVerbs: ReadonlySet<string> = new Set(
  `activate add adjust apply ask assemble attach bring calibrate carry choose compare confirm connect continue
  deactivate decide detach disassemble disconnect discard ensure enter extract fasten fetch go inform insert inspect
  install isolate keep lay leave let listen loosen lubricate make measure obtain observe perform photograph pour
  prepare proceed prove put reassemble reconnect refill refit reinstall remove reopen replace reposition rerun
  restore rinse rotate secure select send separate slacken squeeze stow take tell tighten undo unclip unfasten unhook
  unlock unplug unscrew untie verify wait wipe write`.split(/\s+/),
);

/** Verbs that are nouns or adjectives as well (`plug`, `open`): they instruct where an object stands behind them. */
export const nounLikeVerbs: ReadonlySet<string> = new Set(
  `align balance bleed block blow brake brush call cap catch charge check clamp clean clear clip close cool copy count
  cover crank crimp cycle drain draw drive drop empty fill find fit flow free gauge grip guide hang hold hook idle
  label level lift light link load lock log look loop lower mark match mend mount move note oil open pinch place plug
  point power press pressurise pressurize probe prop pull pump purge push raise range read record release repair
  repeat report reset rest return ride run say scan screw seal search seat set shift show shut slide spray stand start
  step stop store support swap switch tap tape test tie time torque touch trace trap turn twist use vent warm wash
  watch wear work wrap zero`.split(/\s+/),
);

/** What stands between such a verb and its object, or instead of it. */
export const objectWords: ReadonlySet<string> = new Set(
  `a all an another any both each every everything half her his how it its my nothing one our some the their them
  these this those two up what where whether which your`.split(/\s+/),
);

/** Small words that make an instruction of such a verb (`switch off`, `look at`). */
export const particlesOf: Readonly<Record<string, readonly string[]>> = {
  look: ['at', 'for', 'over', 'through', 'to', 'up'],
  shut: ['down', 'off'],
  start: ['up', 'at'],
  stop: ['at', 'here'],
  switch: ['off', 'on', 'over'],
  turn: ['back', 'down', 'off', 'on', 'out', 'to'],
};
