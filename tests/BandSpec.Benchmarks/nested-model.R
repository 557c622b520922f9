# The nested model of CharacterizingSpeed.cs in lme4: its likelihood at our estimates, and its own search with a limit of time.
# Rscript nested-model.R FOLDER SECONDS; writes lme4.csv: version, its deviance at our estimates, processor seconds and evaluations of its
# own search, its deviance there; the last two are NA when it was stopped.
suppressMessages(library(lme4))
arguments <- commandArgs(trailingOnly = TRUE)
readings <- read.csv(file.path(arguments[1], "readings.csv"), colClasses = c(lot = "factor", unit = "factor"))
ours <- read.csv(file.path(arguments[1], "theta.csv"), row.names = 1)
columns <- rownames(ours)
model <- as.formula(paste("y ~ 0 +", paste(columns, collapse = " + "), "+",
  paste0("(0 + ", columns, " | unit)", collapse = " + "), "+", paste0("(0 + ", columns, " | lot)", collapse = " + ")))

parts <- lFormula(model, readings, REML = TRUE, control = lmerControl(check.conv.singular = "ignore"))
deviance <- do.call(mkLmerDevfun, parts)
names <- parts$reTrms$cnms
theta <- mapply(function(group, column) ours[column, group], names(names), unlist(names))
at.ours <- deviance(theta)

search <- tryCatch({
  setTimeLimit(cpu = as.numeric(arguments[2]), transient = TRUE)
  start <- proc.time()
  fit <- suppressMessages(suppressWarnings(lmer(model, readings, REML = TRUE,
    control = lmerControl(calc.derivs = FALSE, check.conv.singular = "ignore"))))
  took <- proc.time() - start
  c(took[["user.self"]] + took[["sys.self"]], fit@optinfo$feval, REMLcrit(fit))
}, error = function(e) c(as.numeric(arguments[2]), NA, NA))
setTimeLimit(cpu = Inf)
writeLines(c(as.character(packageVersion("lme4")), formatC(c(at.ours, search), digits = 17, format = "g")), file.path(arguments[1], "lme4.csv"))
