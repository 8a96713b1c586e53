package fringekeep.interferometry.fringe;

/** The likelihood with the mean and every nuisance parameter fitted anew at each visibility and phase. */
final class FreeLikelihood extends ScanLikelihood {
    /** Steps of less than half a standard error, on which the sum over a smooth period is as good as the integral. */
    private static final int NODES = 32;

    private static final double REACH = 7;

    private final FringeModel model;
    private final FringeSolver solver;
    private final double[] fitted;

    FreeLikelihood(FringeFit fit) {
        super(fit, NODES, REACH);
        model = new FringeModel(fit.data(), fit.options());
        model.polar = true;
        fitted = fit.inside().theta().clone();
        int[] free = new int[model.parameters - 2];
        for (int j = 1; j < free.length; j++) {
            free[j] = j + 2;
        }
        solver = new FringeSolver(model, free);
    }

    @Override
    boolean determined() {
        return true;
    }

    /** Started at the scan's own fit; where its nuisance parameters make the counts impossible, without drift. */
    @Override
    double best(double visibility, double angle) {
        double[] theta = fitted.clone();
        theta[1] = visibility;
        theta[2] = angle;
        if (solver.poisson(theta) != FringeSolver.End.FOUND) {
            theta = fitted.clone();
            theta[1] = visibility;
            theta[2] = angle;
            for (int j = 3; j < theta.length; j++) {
                theta[j] = j == model.backgroundAt ? theta[j] : 0;
            }
            if (solver.poisson(theta) != FringeSolver.End.FOUND) {
                return Double.NEGATIVE_INFINITY;
            }
        }
        model.evaluate(theta);
        return -0.5 * solver.deviance();
    }
}
