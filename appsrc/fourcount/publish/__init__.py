"""What other programs and letters get: the JSON contract, prose, tables. No Qt."""
