import { DataTypes, type Model } from 'sequelize';

// Functions: Sequelize writes into the objects it is given, so none may be shared.
export const id = () => ({ type: DataTypes.INTEGER, primaryKey: true, autoIncrement: true });
export const text = () => ({ type: DataTypes.TEXT });
export const required = () => ({ type: DataTypes.TEXT, allowNull: false });
export const real = () => ({ type: DataTypes.REAL });
export const whole = () => ({ type: DataTypes.INTEGER });

/** UTC instants. STRICT tables know no date type, and Sequelize reads dates by the column's type, so they are read here. */
export const instant = (name: string) => ({
  type: DataTypes.DATE,
  get(this: Model): Date | null {
    const value = this.getDataValue(name) as Date | string | null | undefined;
    return typeof value === 'string' ? new Date(value) : (value ?? null);
  },
});
