"""The effect of a study carried to a patient: which effects, from which starting risk, over which time span.

Four rules say what a range holds. The study's own risk with its own crude effect: the study's direct intervals
(``direct``). A starting risk of other people with limits: both imprecisions propagated. A bare value: the effect's
limits there (both ``at_a_start``). What would pass 100%: a gap, estimate and each limit by itself.
"""
