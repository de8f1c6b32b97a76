import { z } from 'zod'

/** Units in which shops speak of flatness. */
export const heightUnitSchema = z.enum([
  'um',
  'nm',
  'mm',
  'uin',
  'in',
  'thou',
  'tenths',
  'millionths',
  'bands',
])
export type HeightUnit = z.infer<typeof heightUnitSchema>

/** 1 inch = 25.4 mm exactly (international yard and pound agreement, 1959). */
const UM_PER_INCH = 25_400

/** Micrometres in one of each unit of fixed size. */
const umPer: Record<Exclude<HeightUnit, 'bands'>, number> = {
  um: 1,
  nm: 1e-3,
  mm: 1e3,
  uin: UM_PER_INCH / 1e6,
  millionths: UM_PER_INCH / 1e6,
  in: UM_PER_INCH,
  thou: UM_PER_INCH / 1e3,
  tenths: UM_PER_INCH / 1e4,
}

/** Every way of writing a unit that people use, lower case. */
const spellings: Record<string, HeightUnit> = {
  um: 'um',
  µm: 'um',
  micron: 'um',
  microns: 'um',
  micrometre: 'um',
  micrometres: 'um',
  micrometer: 'um',
  micrometers: 'um',
  nm: 'nm',
  nanometre: 'nm',
  nanometres: 'nm',
  mm: 'mm',
  uin: 'uin',
  µin: 'uin',
  microinch: 'uin',
  microinches: 'uin',
  millionth: 'millionths',
  millionths: 'millionths',
  in: 'in',
  inch: 'in',
  inches: 'in',
  '"': 'in',
  thou: 'thou',
  mil: 'thou',
  mils: 'thou',
  tenth: 'tenths',
  tenths: 'tenths',
  band: 'bands',
  bands: 'bands',
}

const symbols: Record<HeightUnit, string> = {
  um: 'µm',
  nm: 'nm',
  mm: 'mm',
  uin: 'µin',
  in: 'in',
  thou: 'thou',
  tenths: 'tenths',
  millionths: 'millionths',
  bands: 'bands',
}

/** How a unit is written after a number. */
export function unitSymbol(unit: HeightUnit): string {
  return symbols[unit]
}

/** Micrometres to a unit; bands need the height of one (`bandUm`). */
export function fromUm(valueUm: number, unit: HeightUnit, bandUm?: number): number {
  return valueUm / umPerUnit(unit, bandUm)
}

/** A unit to micrometres; bands need the height of one (`bandUm`). */
export function toUm(value: number, unit: HeightUnit, bandUm?: number): number {
  return value * umPerUnit(unit, bandUm)
}

function umPerUnit(unit: HeightUnit, bandUm: number | undefined): number {
  if (unit !== 'bands') return umPer[unit]
  if (bandUm === undefined || !(bandUm > 0))
    throw new RangeError('bands mean a height only with a wavelength')
  return bandUm
}

export interface TypedHeightValue {
  valueUm: number
  /** What was typed, without the white space round it. */
  typed: string
  unit: HeightUnit
}

export type ParsedHeight =
  | { ok: true; value: TypedHeightValue }
  /** Each reason has its sentence in the locale files under `common.height.<reason>`. */
  | { ok: false; reason: 'empty' | 'notANumber' | 'unitMissing' | 'unitUnknown' | 'bandsNeedWavelength' }

/**
 * Reads a height with its unit: "0.3 um", "0,3 µm", "11.6 µin", "1.5 bands", "2 tenths", "−0.2 µm". A bare number
 * takes `defaultUnit` where one is given and is refused otherwise; bands need `bandUm`, the height of one.
 */
export function parseHeight(
  text: string,
  options: { bandUm?: number; defaultUnit?: HeightUnit } = {},
): ParsedHeight {
  const typed = text.trim()
  if (typed === '') return { ok: false, reason: 'empty' }
  const match = /^([+\-−]?)\s*(\d+(?:[.,]\d+)?|[.,]\d+)(?:[eE]([+\-−]?\d+))?\s*(.*)$/u.exec(typed)
  if (!match) return { ok: false, reason: 'notANumber' }
  const [, sign, digits, exponent, unitText] = match
  const magnitude = Number(`${digits!.replace(',', '.')}${exponent ? `e${exponent.replace('−', '-')}` : ''}`)
  const unit = unitOf(unitText!, options.defaultUnit)
  if (unit === 'missing') return { ok: false, reason: 'unitMissing' }
  if (unit === 'unknown') return { ok: false, reason: 'unitUnknown' }
  if (unit === 'bands' && !(options.bandUm && options.bandUm > 0))
    return { ok: false, reason: 'bandsNeedWavelength' }
  const value = sign === '-' || sign === '−' ? -magnitude : magnitude
  return { ok: true, value: { valueUm: toUm(value, unit, options.bandUm), typed, unit } }
}

function unitOf(text: string, defaultUnit: HeightUnit | undefined): HeightUnit | 'missing' | 'unknown' {
  // U+03BC (Greek mu) and U+00B5 (micro sign) are written alike.
  const name = text
    .trim()
    .toLowerCase()
    .replace(/\u03bc/g, 'µ')
    .replace(/\.$/, '')
  if (name === '') return defaultUnit ?? 'missing'
  return Object.hasOwn(spellings, name) ? spellings[name]! : 'unknown'
}

const MINUS = '\u2212'

/** A number with a fixed count of decimals, U+2212 for minus, and never a negative nought. */
export function formatNumber(value: number, decimals: number, signed = false): string {
  const text = Math.abs(value).toFixed(decimals)
  const isNought = Number(text) === 0
  if (value < 0 && !isNought) return `${MINUS}${text}`
  return signed && !isNought ? `+${text}` : text
}

const usualDecimals: Record<HeightUnit, number> = {
  um: 3,
  nm: 0,
  mm: 6,
  uin: 1,
  in: 7,
  thou: 4,
  tenths: 3,
  millionths: 1,
  bands: 2,
}

export interface HeightFormat {
  decimals?: number
  /** Plus sign before heights above nought. */
  signed?: boolean
  bandUm?: number
  /** Leave the unit off, for columns whose head names it. */
  bare?: boolean
}

/** A height in a unit, as a person reads it: "0.464 µm". */
export function formatHeight(valueUm: number, unit: HeightUnit, format: HeightFormat = {}): string {
  const decimals = format.decimals ?? usualDecimals[unit]
  const number = formatNumber(fromUm(valueUm, unit, format.bandUm), decimals, format.signed)
  return format.bare ? number : `${number} ${unitSymbol(unit)}`
}

/**
 * A figure with its uncertainty, both to the same decimals: as many as give U two significant digits, but no more
 * than the unit's usual ones (JCGM 100, 7.2.6).
 */
export function formatWithUncertainty(
  valueUm: number,
  uUm: number,
  unit: HeightUnit,
  bandUm?: number,
): { value: string; u: string; unit: string } {
  const u = fromUm(uUm, unit, bandUm)
  const wanted = u > 0 ? 1 - Math.floor(Math.log10(u)) : usualDecimals[unit]
  const decimals = Math.min(usualDecimals[unit], Math.max(0, wanted))
  return {
    value: formatNumber(fromUm(valueUm, unit, bandUm), decimals),
    u: `±${roundedUp(u, decimals)}`,
    unit: unitSymbol(unit),
  }
}

/** Uncertainties are rounded up, so that rounding never narrows them; rounding noise of 1e-9 doesn't count. */
function roundedUp(u: number, decimals: number): string {
  const step = 10 ** -decimals
  return (Math.ceil(u / step - 1e-9) * step).toFixed(decimals)
}

/**
 * Two parts and their sum rounded so that the printed parts add up to the printed sum: the sum is rounded on its
 * own, the part whose rounding hurts least gives way. Used for peak + valley = peak to valley.
 */
export function roundParts(
  first: number,
  second: number,
  decimals: number,
): { first: number; second: number; sum: number } {
  const scale = 10 ** decimals
  const sum = Math.round((first + second) * scale)
  let a = Math.round(first * scale)
  let b = Math.round(second * scale)
  const excess = a + b - sum
  if (excess !== 0) {
    const lossFirst = Math.abs((a - excess) / scale - first)
    const lossSecond = Math.abs((b - excess) / scale - second)
    if (lossFirst <= lossSecond) a -= excess
    else b -= excess
  }
  return { first: a / scale, second: b / scale, sum: sum / scale }
}
