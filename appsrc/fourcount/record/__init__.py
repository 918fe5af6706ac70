"""What the reader typed and chose: frozen types, text kept as typed. No Qt, no files, no clock."""
