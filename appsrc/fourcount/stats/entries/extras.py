"""What stands beside the measures of a table: attributable fractions, E-value, fragility, losses, clusters.

Levin, Miettinen, Walter, Fleiss and VanderWeele’s conversions are cited from memory.
"""

from __future__ import annotations

from fourcount.stats.entries.entry import Calculation

EXTRAS = (
    Calculation(
        key="attributable-exposed",
        title="Attributable fraction among the exposed",
        formula="(R − 1)/R, at the risk ratio R and at each of its limits",
        source="Common practice",
        note="Takes the ratio as causal. A ratio below 1 has none, nor has an infinite one.",
    ),
    Calculation(
        key="prevented-exposed",
        title="Prevented fraction among the exposed",
        formula="1 − R, at the risk ratio R and at each of its limits",
        source="Common practice",
        note="Takes the ratio as causal. A ratio above 1 has none.",
    ),
    Calculation(
        key="attributable-population",
        title="Attributable fraction in the population",
        formula="F = pc (R − 1)/R, pc = a/m; 1 − (1 − F) exp(± z s), s² = (b + F(a + d))/(N c)",
        source="Miettinen 1974; interval Walter 1975, Fleiss 1979, Am J Epidemiol 110:103",
        note=(
            "Takes the ratio as causal, and the table’s people as exposed as the population is. The interval is for "
            "people sampled without regard to exposure and outcome."
        ),
    ),
    Calculation(
        key="attributable-levin",
        title="Attributable fraction in the population, from a given prevalence",
        formula="pe (R − 1)/(1 + pe (R − 1)), at the risk ratio R and at each of its limits",
        source="Levin 1953",
        note="The prevalence pe of the exposure is taken as known without error, and the ratio as causal.",
    ),
    Calculation(
        key="e-value",
        title="E-value",
        formula="R + √(R(R − 1)), R the risk ratio, or 1 over it where it is below 1; for the limit nearest 1 likewise",
        source="VanderWeele and Ding 2017, Ann Intern Med 167:268",
        note="1 for the limit where the interval holds 1.",
    ),
    Calculation(
        key="e-value-odds",
        title="Odds ratio of a common outcome as a risk ratio",
        formula="√OR",
        source="VanderWeele 2017",
        note="For the E-value only, where the outcome is common. For a rare one the odds ratio stands as it is.",
    ),
    Calculation(
        key="e-value-hazards",
        title="Hazard ratio of a common outcome as a risk ratio",
        formula="(1 − 0.5^√HR)/(1 − 0.5^√(1/HR))",
        source="VanderWeele and Ding 2017, Ann Intern Med 167:268",
        note="For the E-value only, where the outcome is common. For a rare one the hazard ratio stands as it is.",
    ),
    Calculation(
        key="fragility",
        title="Fragility index",
        formula="The fewest events to add to the group with the lower risk, its size fixed, until Fisher’s p is 0.05",
        source="Walsh and others 2014, J Clin Epidemiol 67:622",
        note="To be read beside the number lost to follow-up.",
    ),
    Calculation(
        key="losses",
        title="People lost to follow-up",
        formula="(x + L min(1, k x/n))/(n + L); L people lost, whose risk is k times that of the n followed",
        source="Akl and others 2012, BMJ 344:e2809",
        note=(
            "Worst: of one group all the lost, of the other none, against the observed direction; best: the opposite. "
            "With equal risks, worst is whichever of the two parts the risks more. Intervals treat the people put back "
            "as if they had been seen, so they are too narrow."
        ),
    ),
    Calculation(
        key="design-effect",
        title="Design effect of clusters",
        formula="1 + (M − 1) ICC, M the clusters’ mean size; every count is divided by it",
        source="Cochrane Handbook 23.1.4",
        note="Risks and ratios stay, intervals widen. Exact methods do not take the fractions that come of it.",
    ),
)
"""Calculations that give neither an interval of a measure nor a test."""
