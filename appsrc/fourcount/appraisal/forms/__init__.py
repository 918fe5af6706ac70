"""What follows from each form of print: one module for each, all with one way in (outcome, choices, pace)."""
