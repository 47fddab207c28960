# Runs a block of printed lines and reports, for each statement that ends in "# numbers", what it gave:
# line <tab> values <tab> printed. Usage: Rscript printed-lines.R FILE
lines <- readLines(commandArgs(trailingOnly = TRUE)[1], encoding = "UTF-8")
statements <- parse(text = lines, keep.source = TRUE, encoding = "UTF-8")
places <- attr(statements, "srcref")
for (i in seq_along(statements)) {
  value <- eval(statements[[i]], globalenv())
  last <- lines[places[[i]][3]]
  if (!grepl("  # ", last, fixed = TRUE)) next
  printed <- strsplit(trimws(sub(".*  # ", "", last)), " ")[[1]]
  if (anyNA(suppressWarnings(as.numeric(printed)))) next
  cat(last, paste(format(as.numeric(value), digits = 17), collapse = " "), paste(printed, collapse = " "), sep = "\t")
  cat("\n")
}
