# Writes the data sets that NestedModelFigures.cs reads. Debian bookworm, R 4.2.2, lme4 1.1-31:
#   Rscript make_nested_models.R
suppressMessages(library(lme4))
write <- function(data, name, source) {
  file <- file(name, "w")
  writeLines(paste("#", source), file)
  utils::write.csv(data, file, row.names = FALSE, quote = FALSE)
  close(file)
}
write(data.frame(lot = "", unit = sleepstudy$Subject, x = sleepstudy$Days, reading = sleepstudy$Reaction), "sleepstudy.csv",
      "lme4 1.1-31, object sleepstudy: reaction times in ms over days of sleep deprivation; Belenky et al. 2003, J. Sleep Res. 12, 1-12")
write(data.frame(lot = "", unit = Dyestuff$Batch, x = 0, reading = Dyestuff$Yield), "dyestuff.csv",
      "lme4 1.1-31, object Dyestuff: yield of dyestuff in grams by batch; Davies & Goldsmith 1972, Statistical Methods in Research and Production")
write(data.frame(lot = "", unit = Dyestuff2$Batch, x = 0, reading = Dyestuff2$Yield), "dyestuff2.csv",
      "lme4 1.1-31, object Dyestuff2: simulated yields; Box & Tiao 1973, Bayesian Inference in Statistical Analysis")
write(data.frame(lot = Pastes$batch, unit = Pastes$sample, x = 0, reading = Pastes$strength), "pastes.csv",
      "lme4 1.1-31, object Pastes: strength of a paste, casks within batches; Davies & Goldsmith 1972")
