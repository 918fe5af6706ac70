"""From a record to its findings: what a design supports, the patient, which cautions hold. Keys, not words."""
