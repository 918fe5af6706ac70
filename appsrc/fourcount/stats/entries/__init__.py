"""The entries of the table of methods, by measure."""
