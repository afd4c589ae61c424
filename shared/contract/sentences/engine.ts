/** What the engine says: reasons, cautions, dangers, modes. */
export const engineSentences = {
  'reason.prove supply':
    'Shows that meter, range, supply and return are sound before anything is read as dead.',
  'reason.prove return': 'Shows that the return is whole, by the other pole of the supply.',
  'reason.locate': 'Leads to a proved finding in the least minutes.',
  'reason.confirm': 'Measures the part itself: only that proves it.',
  'reason.different': 'Rests the finding on a second, different reading.',
  'reason.repeat': 'The same reading once more, probes lifted and meter proven first.',
  'reason.looking is free': 'Looking at {parts} costs nothing and says which half is open.',
  'reason.reads as with this fault':
    '{tags} read {volts} V, as with this fault; healthy it would read {healthy} V.',
  'reason.would read otherwise':
    '{tags} read {volts} V; with this part at fault it would read {would} V.',
  'reason.fits the readings': 'Fits the readings so far.',
  'reason.all readings are healthy': 'Every reading is as on a healthy lift.',
  'reason.no reading tells more': 'No reading that can be reached would tell more.',
  'reason.halves what is left': 'Halves what is left: {left} against {right} in 100.',
  'reason.live beyond': '{tags} read live: current reaches beyond {parts}.',
  'reason.dead before': '{tags} read dead: {parts} stands between it and the supply.',
  'reason.measured across': 'Measured on the part itself.',
  'reason.condition': 'Needs {parts}: as the lift stands this reading would say nothing.',
  'caution.live terminals.can': 'Live terminals: shock and burns.',
  'caution.live terminals.do':
    'Rated fused probes, one hand, covers back when done. Work dead where you can.',
  'caution.may start when cleared.can': 'The lift may start the moment the fault clears.',
  'caution.may start when cleared.do':
    'People clear. Keep the car under your own control by your firm’s method, not by the string under test.',
  'caution.people and motion.can': 'This can move the car or a door.',
  'caution.people and motion.do':
    'People seen or spoken to and clear; motor and brake feed made safe first.',
  'caution.shaft entry.can': 'You are about to enter the shaft: moving car, falls, crushing.',
  'caution.shaft entry.do':
    'Your firm’s entry procedure: barrier, stop switch proven, someone knows where you are.',
  'caution.car top.can': 'Car top: falls, shearing, a car that moves.',
  'caution.car top.do': 'Stop and inspection proven before you step on; exit in reverse.',
  'caution.pit.can': 'Pit: crushing under the car, water near live parts.',
  'caution.pit.do': 'Pit stop pressed and proven, light on, refuge known, before you go down.',
  'caution.landing door.can': 'An open landing door is a fall into the shaft.',
  'caution.landing door.do':
    'Barrier first; look for the car before you lean in; never leave it open.',
  'caution.high voltage dc.can': 'More than 120 V DC: an arc does not go out by itself.',
  'caution.high voltage dc.do':
    'Meter and fuses rated for DC at this voltage; stop if this panel is not within your authorisation.',
  'caution.return may be live.can': 'The return may be live.',
  'caution.return may be live.do':
    'High-impedance meter only, no lamp; treat the return as live until it is proven.',
  'caution.mains.can': 'Mains voltage.',
  'caution.mains.do': 'Category and rating of the meter checked; distance to bare parts kept.',
  'danger.volts beyond open device': 'Volts beyond {part}, which is open: something bridges it.',
  'danger.relay in without volts':
    'Relay {part} is in with no volts on its coil: welded, or held in.',
  'danger.device does not open string': '{part} does not open the string.',
  'danger.car moved with door open': 'The car moved with a door open.',
  'danger.second earth': 'A second earth: contacts may be bridged through it.',
  'mode.open': 'open',
  'mode.resistive': 'high resistance',
  'mode.not opening': 'does not open',
  'mode.blown': 'blown',
  'mode.dead': 'dead',
  'mode.low': 'low',
  'mode.high': 'high',
  'mode.weak': 'weak under load',
  'mode.diode open': 'one diode open',
  'mode.diode shorted': 'one diode shorted',
  'mode.partly shorted': 'turns shorted',
  'mode.stuck in': 'stuck in',
  'mode.stuck out': 'stuck out',
  'mode.earth': 'touching earth',
} as const;
