"""What stands between a file's bytes and a record: JSON read with care, formats, limits, refusals."""
