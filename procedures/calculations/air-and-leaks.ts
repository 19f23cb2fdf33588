/** The calculations of air, its flow and its leaks, some of which a procedure's expressions may call. */
export { dryAirDensity, type DryAir } from './dry-air';
export { speedDensityAirflow, volumetricEfficiency, type EngineAir } from './engine-airflow';
export { fitDecay, type DecayFit, type DecaySample, type DecayVolume } from './fit-decay';
export { moistAirDensity, type MoistAir } from './moist-air';
export { orificeDiameter, orificeMassFlow, type OrificeConditions, type OrificeFlow } from './orifice';
export { decayLeakRate, type DecayTest, type LeakRate } from './pressure-decay';
