package fringekeep.interferometry.trace;

import fringekeep.interferometry.constants.Codata2018;
import fringekeep.interferometry.statistics.Estimate;

/**
 * Damping of a sphere by a dilute gas whose mean free path exceeds it by far, and the radius and mass that follow.
 *
 * <p>&Gamma; = &delta; p m_g v_th/(kT &rho; r), v_th = &radic;(8kT/(&pi;m_g)) the mean speed of the gas; &delta; = 1
 * for specular, 1 + &pi;/8 for fully accommodated diffuse reflection. Source: P. S. Epstein, Phys. Rev. 23, 710 (1924);
 * factors from memory.
 *
 * @param pressure      gas pressure (Pa)
 * @param temperature   gas temperature (K)
 * @param gasMass       mass of a gas particle (kg)
 * @param accommodation &delta;, from 1 to 1 + &pi;/8
 */
public record GasDamping(double pressure, double temperature, double gasMass, double accommodation) {
    /** Diffuse reflection with full accommodation. */
    public static final double DIFFUSE = 1.0 + Math.PI / 8.0;

    /** Checks the numbers. */
    public GasDamping {
        if (!(pressure > 0.0 && temperature > 0.0 && gasMass > 0.0)) {
            throw new IllegalArgumentException("pressure " + pressure + " Pa, temperature " + temperature
                    + " K and gas mass " + gasMass + " kg must be positive");
        }
        if (!(accommodation >= 1.0 && accommodation <= DIFFUSE)) {
            throw new IllegalArgumentException(
                    "the accommodation factor lies between 1 and " + DIFFUSE + ", not " + accommodation);
        }
    }

    /** Momentum flux factor &delta; p m_g v_th/(kT) (kg m^-2 s^-1). */
    private double flux() {
        double thermal = Codata2018.BOLTZMANN_CONSTANT * temperature;
        return accommodation * pressure * gasMass * Math.sqrt(8.0 * thermal / (Math.PI * gasMass)) / thermal;
    }

    /**
     * Damping of a sphere.
     *
     * @param radius  radius (m)
     * @param density density of its material (kg/m^3)
     * @return &Gamma; (rad/s)
     */
    public double damping(double radius, double density) {
        return flux() / (density * radius);
    }

    /**
     * Radius from damping.
     *
     * @param damping &Gamma; (rad/s)
     * @param density density of the sphere's material (kg/m^3)
     * @return radius (m), with the relative uncertainty of the damping
     */
    public Estimate radius(Estimate damping, double density) {
        double radius = flux() / (density * damping.value());
        return new Estimate(radius, radius * damping.standardUncertainty() / damping.value());
    }

    /**
     * Mass from damping.
     *
     * @param damping &Gamma; (rad/s)
     * @param density density of the sphere's material (kg/m^3)
     * @return mass (kg), with three times the relative uncertainty of the damping
     */
    public Estimate mass(Estimate damping, double density) {
        double radius = radius(damping, density).value();
        double mass = 4.0 / 3.0 * Math.PI * radius * radius * radius * density;
        return new Estimate(mass, 3.0 * mass * damping.standardUncertainty() / damping.value());
    }
}
