/** The step-down switching regulator in equations: one switch, one freewheel diode, one choke. */

/** What fixes its duty. Volts by size, all more than zero but the drops, which may be zero. */
export interface BuckVolts {
  readonly inputVolts: number;
  readonly outputVolts: number;
  /** Drop of the switch while on. */
  readonly switchVolts: number;
  /** Drop of the freewheel diode. */
  readonly diodeVolts: number;
}

/**
 * Share of the time that the switch is on while the choke carries current all the time: D = (Vo + Vd) ÷ (Vi − Vs + Vd).
 * @returns more than 1 when the input is too low for the output
 */
export function dutyOf({ inputVolts, outputVolts, switchVolts, diodeVolts }: BuckVolts): number {
  return (outputVolts + diodeVolts) / (inputVolts - switchVolts + diodeVolts);
}

/** Currents of one period. */
export interface BuckCurrents {
  /** False where the choke runs empty in each period. */
  readonly continuous: boolean;
  readonly duty: number;
  /** Share of the period in which the diode conducts. */
  readonly diodeDuty: number;
  /** Peak to peak, in the choke. */
  readonly rippleAmps: number;
  readonly peakAmps: number;
  readonly valleyAmps: number;
  readonly switchAverageAmps: number;
  readonly diodeAverageAmps: number;
  /** Load below which the choke runs empty. */
  readonly emptyBelowAmps: number;
}

/**
 * Currents at a load, with the choke running empty or not.
 * @param amps load, more than zero
 * @param henries of the choke
 * @param hertz of the switch
 */
export function buckCurrents(volts: BuckVolts, amps: number, henries: number, hertz: number): BuckCurrents {
  const up = volts.inputVolts - volts.switchVolts - volts.outputVolts;
  const down = volts.outputVolts + volts.diodeVolts;
  const full = dutyOf(volts);
  const ripple = (up * full) / (henries * hertz);
  if (amps >= ripple / 2) {
    return {
      continuous: true,
      duty: full,
      diodeDuty: 1 - full,
      rippleAmps: ripple,
      peakAmps: amps + ripple / 2,
      valleyAmps: amps - ripple / 2,
      switchAverageAmps: amps * full,
      diodeAverageAmps: amps * (1 - full),
      emptyBelowAmps: ripple / 2,
    };
  }
  // Empty in each period: the triangle of peak (up · D)/(L f) and base D + D2 holds the load's charge.
  const duty = Math.sqrt((2 * henries * hertz * amps * down) / (up * (up + down)));
  const peak = (up * duty) / (henries * hertz);
  const diodeDuty = (up / down) * duty;
  return {
    continuous: false,
    duty,
    diodeDuty,
    rippleAmps: peak,
    peakAmps: peak,
    valleyAmps: 0,
    switchAverageAmps: (peak * duty) / 2,
    diodeAverageAmps: (peak * diodeDuty) / 2,
    emptyBelowAmps: ripple / 2,
  };
}

/**
 * Output ripple, peak to peak, of a choke that never runs empty into C with ESR: exact for the triangle, found where the
 * slopes of the ESR's share and the capacitor's share cancel. With no ESR it is ΔI ÷ (8 f C), with much of it ΔI × ESR.
 */
export function triangleRippleVolts(rippleAmps: number, duty: number, hertz: number, farads: number, esrOhms: number): number {
  const [rise, fall] = [duty / hertz, (1 - duty) / hertz];
  const late = (slope: number): number => Math.max(0, slope / 2 - esrOhms * farads);
  const shareAt = (time: number, slope: number): number =>
    rippleAmps * (esrOhms * (1 / 2 - time / slope) + (time / 2 - (time * time) / (2 * slope)) / farads);
  return shareAt(late(fall), fall) + shareAt(late(rise), rise);
}

/** What makes a self-oscillating (hysteretic) regulator switch. */
export interface HystereticLoop {
  readonly inputVolts: number;
  readonly outputVolts: number;
  readonly henries: number;
  readonly farads: number;
  readonly esrOhms: number;
  /** Window of the comparator, at its own input. */
  readonly windowVolts: number;
  /** Output volts divided by the volts at the comparator; 1 where a capacitor feeds the ripple forward. */
  readonly divider: number;
  /** From the comparator to the switch. */
  readonly delaySeconds: number;
}

/**
 * Frequency of a hysteretic regulator whose ripple comes from the ESR:
 * f = Vo (Vi − Vo)(ESR − t ÷ C) ÷ (Vi (window × divider × L + Vi × ESR × t)).
 * @returns hertz; zero or less where the ESR is too small for the law
 * @source LM3475 data sheet, equation 4 (without the t ÷ C), and TPS5103 data sheet, p. 22 (with it)
 */
export function hystereticHertz(loop: HystereticLoop): number {
  const { inputVolts: vi, outputVolts: vo, henries, farads, esrOhms, windowVolts, divider, delaySeconds } = loop;
  const drive = vo * (vi - vo) * (esrOhms - delaySeconds / farads);
  return drive / (vi * (windowVolts * divider * henries + vi * esrOhms * delaySeconds));
}
