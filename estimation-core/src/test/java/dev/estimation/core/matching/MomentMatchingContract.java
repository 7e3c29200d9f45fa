package dev.estimation.core.matching;

/** What every matching owes. A new one gets all of it by a subclass of a few lines. */
abstract class MomentMatchingContract
    implements AffineChecks,
        ZeroVarianceChecks,
        ActiveInputChecks,
        ConductChecks,
        AngleChecks,
        RotationChecks,
        ConditioningChecks {}
