#include "cli/losses_command.hpp"

#include <algorithm>
#include <cstddef>
#include <filesystem>
#include <string>
#include <utility>
#include <vector>

#include "cli/output_files.hpp"
#include "cli/same_file.hpp"
#include "cli/terminal.hpp"
#include "rainledger/ledger/ledger.hpp"
#include "rainledger/report/json.hpp"
#include "rainledger/report/ledger_csv.hpp"
#include "rainledger/report/summary.hpp"
#include "rainledger/scenario/scenario.hpp"
#include "rainledger/scenario/warnings.hpp"

namespace rainledger {
namespace {

constexpr double kMostReportingSteps = 1.0e7;  // a slip in --every, not a wish

bool is_error(const Diagnostic& diagnostic) {
    return diagnostic.severity == Severity::error;
}

/// "3 errors in FILE" where one file holds them all, else "3 errors".
std::string error_count_text(const Diagnostics& diagnostics) {
    const auto& list = diagnostics.list();
    const auto first = std::ranges::find_if(list, is_error);
    const std::size_t count = diagnostics.error_count();
    std::string out = std::to_string(count) + (count == 1 ? " error" : " errors");
    const bool one_file = std::ranges::all_of(list, [&](const Diagnostic& diagnostic) {
        return !is_error(diagnostic) || diagnostic.place.file == first->place.file;
    });
    if (one_file) out += " in " + first->place.file;
    return out;
}

/// Ends a run whose input is wrong; an unreadable file counts less than a wrong one.
ExitStatus refuse(const Messages& messages, const Diagnostics& diagnostics) {
    messages.show(diagnostics);
    messages.error(error_count_text(diagnostics) + "; nothing was computed");
    const bool any_wrong =
        std::ranges::any_of(diagnostics.list(), [](const Diagnostic& diagnostic) {
            return is_error(diagnostic) && diagnostic.trouble == Trouble::input;
        });
    return any_wrong ? ExitStatus::wrong_input : ExitStatus::file_trouble;
}

/// The rain files of a scenario, found as the scenario's reader finds them.
std::vector<std::string> rain_files(const Scenario& scenario, const std::string& path) {
    const std::filesystem::path folder = std::filesystem::path(path).parent_path();
    std::vector<std::string> files;
    for (const Storm& storm : scenario.storms)
        if (!storm.file.empty()) files.push_back((folder / storm.file).string());
    return files;
}

/// What only the scenario shows to be wrong with the command line; empty when nothing is.
std::string late_problem(const LossesOptions& options, const Scenario& scenario) {
    const std::vector<std::string> inputs = rain_files(scenario, options.scenario);
    for (const std::string& output : options.output_paths())
        for (const std::string& input : inputs)
            if (is_same_file(output, input))
                return "'" + output + "' is the scenario's rain; name another file to write";
    for (const Storm& storm : scenario.storms) {
        const auto& edges_h = storm.rain.edges_h;
        if (options.every_h &&
            edges_h.back() - edges_h.front() > kMostReportingSteps * *options.every_h)
            return "--every: that step would cut a storm into more than 10 million";
    }
    return {};
}

std::string located(const Place& place, const std::string& message) {
    if (place.line == 0) return place.file + ": " + message;
    return place.file + ":" + std::to_string(place.line) + ":" + std::to_string(place.column) +
           ": " + message;
}

struct Results {
    std::vector<SiteLedger> ledgers;    // one per storm
    std::vector<std::string> warnings;  // as the JSON lists them
};

Results keep_ledgers(const Scenario& scenario, Diagnostics& diagnostics) {
    Results results;
    for (const Storm& storm : scenario.storms) {
        results.ledgers.push_back(keep_ledger(scenario.site, storm.rain));
        report_unmatched(scenario, storm, results.ledgers.back(), diagnostics);
    }
    return results;
}

/// Prints every warning and collects it for the JSON.
void warn(const LossesOptions& options, const Messages& messages, const Scenario& scenario,
          Diagnostics& diagnostics, Results& results) {
    for (std::size_t i = 0; i < scenario.storms.size(); ++i)
        warn_of_results(scenario, scenario.storms[i], results.ledgers[i], diagnostics);
    messages.show(diagnostics);
    for (const Diagnostic& diagnostic : diagnostics.list())
        results.warnings.push_back(located(diagnostic.place, diagnostic.message));
    if (options.every_h && !options.ledger)
        messages.note("--every shapes the ledger file alone; --ledger FILE.csv writes one");
}

std::string ledger_text(const LossesOptions& options, const Scenario& scenario,
                        const Results& results) {
    const bool with_start = has_start_column(scenario);
    std::string out;
    append_ledger_header(out, with_start);
    for (std::size_t i = 0; i < scenario.storms.size(); ++i) {
        const Storm& storm = scenario.storms[i];
        if (options.every_h)
            append_ledger_rows(
                out, scenario.site, storm,
                report_every(scenario.site, storm.rain, *options.every_h, results.ledgers[i]),
                with_start);
        else
            append_ledger_rows(out, scenario.site, storm, results.ledgers[i], with_start);
    }
    return out;
}

/// Writes every file in the order of options.output_paths(), then standard output, then gives the
/// files their names.
bool write_all(const LossesOptions& options, const Scenario& scenario, const Results& results,
               OutputFiles& files, std::string& problem) {
    if (options.ledger && !files.write_next(ledger_text(options, scenario, results), problem))
        return false;
    std::string json;
    if (options.json) json = results_json(scenario, results.ledgers, results.warnings);
    if (options.json && !options.json_on_stdout() && !files.write_next(json, problem)) return false;
    const std::string shown = options.json_on_stdout()
                                  ? std::move(json)
                                  : summary(scenario, results.ledgers, {options.units});
    if (!write_results(shown, problem)) {
        problem.insert(0, "standard output: ");
        return false;
    }
    return files.commit(problem);
}

}  // namespace

ExitStatus run_losses(const LossesOptions& options) {
    const Messages messages(options.quiet);
    Diagnostics diagnostics;
    const std::optional<Scenario> scenario = read_scenario(options.scenario, diagnostics);
    if (!scenario) return refuse(messages, diagnostics);
    if (const std::string problem = late_problem(options, *scenario); !problem.empty()) {
        print_wrong_usage("losses", problem);
        return ExitStatus::wrong_usage;
    }

    std::string problem;
    OutputFiles files;
    const bool opened = std::ranges::all_of(
        options.output_paths(), [&](const std::string& path) { return files.open(path, problem); });
    // Marched even where an output cannot be written: an input error that only the march can tell
    // comes first.
    Results results = keep_ledgers(*scenario, diagnostics);
    if (diagnostics.has_errors()) return refuse(messages, diagnostics);
    if (!opened) {
        messages.error("cannot write " + problem);
        return ExitStatus::file_trouble;
    }
    warn(options, messages, *scenario, diagnostics, results);
    if (!write_all(options, *scenario, results, files, problem)) {
        messages.error("cannot write " + problem);
        return ExitStatus::file_trouble;
    }
    return ExitStatus::done;
}

}  // namespace rainledger
