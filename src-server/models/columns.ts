import { DataTypes } from 'sequelize'
import { newKey } from './key'

/** The kinds of column that models have; the migrations say the same in their own words. */

/** The row's own key, made when it is. */
export const ownKey = () => ({ type: DataTypes.CHAR(36), primaryKey: true, defaultValue: newKey })
/** The key of a row elsewhere. */
export const key = () => ({ type: DataTypes.CHAR(36), allowNull: false })
export const keyOrNone = () => ({ type: DataTypes.CHAR(36), allowNull: true })
/** A short word of a closed list. */
export const word = () => ({ type: DataTypes.STRING(32), allowNull: false })
export const wordOrNone = () => ({ type: DataTypes.STRING(32), allowNull: true })
export const line = (length = 500) => ({ type: DataTypes.STRING(length), allowNull: false })
export const lineOrNone = (length = 500) => ({ type: DataTypes.STRING(length), allowNull: true })
/** Up to 16 MB of text, kept as it is written. */
export const longText = () => ({ type: DataTypes.TEXT('medium'), allowNull: false })
export const longTextOrNone = () => ({ type: DataTypes.TEXT('medium'), allowNull: true })
export const whole = () => ({ type: DataTypes.INTEGER, allowNull: false })
export const wholeOrNone = () => ({ type: DataTypes.INTEGER, allowNull: true })
/** Bytes of a file may pass 2³¹; they come back as a number. */
export const bytes = () => ({ type: DataTypes.BIGINT, allowNull: false })
/** A length in millimetres, float64. */
export const lengthMm = () => ({ type: DataTypes.DOUBLE, allowNull: false })
export const lengthMmOrNone = () => ({ type: DataTypes.DOUBLE, allowNull: true })
/** An amount of money, always text in the program. */
export const moneyOrNone = () => ({ type: DataTypes.DECIMAL(16, 4), allowNull: true })
/** UTC to the millisecond. */
export const instant = () => ({ type: DataTypes.DATE(3), allowNull: false })
export const instantOrNone = () => ({ type: DataTypes.DATE(3), allowNull: true })
/** A day without a time, as text 2026-12-01. */
export const dayOrNone = () => ({ type: DataTypes.DATEONLY, allowNull: true })
export const document = () => ({ type: DataTypes.JSON, allowNull: false })
export const documentOrNone = () => ({ type: DataTypes.JSON, allowNull: true })
/** SHA-256 in lower-case hexadecimal. */
export const digest = () => ({ type: DataTypes.CHAR(64), allowNull: false })
export const digestOrNone = () => ({ type: DataTypes.CHAR(64), allowNull: true })
export const yesOrNo = () => ({ type: DataTypes.BOOLEAN, allowNull: false })
/** Counts up on every save; a save of an older one fails. */
export const editVersion = () => ({ type: DataTypes.INTEGER, allowNull: false, defaultValue: 0 })
