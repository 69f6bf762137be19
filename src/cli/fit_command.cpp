#include "cli/fit_command.hpp"

#include <algorithm>
#include <filesystem>
#include <string_view>
#include <utility>

#include "cli/read_input.hpp"
#include "cli/same_file.hpp"
#include "rainledger/chart/fit_chart.hpp"
#include "rainledger/fieldtest/field_fit.hpp"
#include "rainledger/fieldtest/readings_csv.hpp"
#include "rainledger/report/fit_report.hpp"
#include "rainledger/scenario/field_test_file.hpp"

namespace rainledger {
namespace {

/// A test with its readings, ready to be fitted.
struct TestToFit {
    std::string title;
    std::string readings;       ///< the file as named
    std::string readings_path;  ///< as opened
    std::optional<Rings> rings;
    FieldFitOptions options;
    Place place;  ///< what the fit may find wrong
    std::vector<InfiltrationTest> tests;
};

SteadyUse steady_use(SteadyWish wish) {
    switch (wish) {
        case SteadyWish::fitted:
            return SteadyUse::fitted;
        case SteadyWish::fixed:
            return SteadyUse::fixed;
        case SteadyWish::tail:
            break;
    }
    return SteadyUse::tail;
}

std::vector<FieldLaw> laws_of(const FieldTestFile& file) {
    if (file.laws.empty()) return {kFieldLaws.begin(), kFieldLaws.end()};
    std::vector<FieldLaw> laws;
    for (const std::string& name : file.laws)
        laws.push_back(*std::ranges::find(kFieldLaws, name, field_law_key));
    return laws;
}

/// Reads the rows of a test; false after adding to `diagnostics`.
bool read_rows(TestToFit& test, std::string text, Diagnostics& diagnostics) {
    auto readings = read_readings_csv(test.readings_path, std::move(text), test.rings, diagnostics);
    if (readings) test.tests = std::move(readings->tests);
    return readings.has_value();
}

std::optional<TestToFit> read_described(const std::string& path, std::string text,
                                        Diagnostics& diagnostics) {
    auto file = read_field_test_text(path, std::move(text), diagnostics);
    if (!file) return std::nullopt;
    TestToFit test;
    test.title = file->title;
    test.readings = file->readings;
    test.readings_path = file->readings_path;
    if (file->ring) test.rings = Rings{file->ring->inner_mm, file->ring->outer_mm};
    test.options.laws = laws_of(*file);
    test.options.steady_use = steady_use(file->steady);
    test.options.fixed_rate_mm_per_h = file->fixed_rate_mm_per_h;
    test.options.ignore_first_h = file->ignore_first_h;
    test.options.design_factor = file->design_factor;
    test.place = file->ignore_first;
    if (!read_rows(test, std::move(file->readings_text), diagnostics)) return std::nullopt;
    return test;
}

std::optional<TestToFit> read_plain(const FitOptions& options, std::string text,
                                    Diagnostics& diagnostics) {
    TestToFit test;
    test.title = std::filesystem::path(options.input).filename().string();
    test.readings = options.input;
    test.readings_path = options.input;
    test.rings = options.rings;
    test.options.design_factor = options.design_factor.value_or(1.0);
    test.place.file = options.input;
    if (!read_rows(test, std::move(text), diagnostics)) return std::nullopt;
    return test;
}

/// Options that a YAML states itself.
std::string misplaced(const FitOptions& options) {
    const auto stated = [&](std::string_view option, std::string_view key) {
        return "--" + std::string(option) + " goes with a CSV of readings, and '" + options.input +
               "' is a field test; state '" + std::string(key) + ":' in it";
    };
    if (options.rings) return stated("ring", "ring");
    if (options.design_factor) return stated("design-factor", "design_factor");
    return {};
}

/// What is wrong with the command line once the test is known.
std::string late_problem(const FitOptions& options, const TestToFit& test) {
    for (const Output& output : options.outputs())
        if (is_same_file(output.path, test.readings_path))
            return "'" + output.path + "' holds the test's readings; name another file to write";
    const auto& laws = test.options.laws;
    if (options.law && std::ranges::find(laws, *options.law) == laws.end())
        return "--law: the test's 'laws:' leave out " + std::string(field_law_key(*options.law));
    return {};
}

/// The fit, or nothing after adding to `diagnostics`.
std::optional<ShownFit> fitted(TestToFit test, Diagnostics& diagnostics) {
    FieldFitAnswer answer = fit_field_tests(test.tests, test.options);
    for (std::string& problem : answer.problems)
        diagnostics.error(test.place, std::move(problem));
    if (!answer.fit) return std::nullopt;
    return ShownFit{std::move(test.title), std::move(test.readings),
                    test.rings && !test.rings->outer_diameter_mm, *std::move(answer.fit)};
}

/// What is written, in the order of the outputs.
struct Results {
    std::string csv;
    std::string json;
    std::string yaml;
    std::string chart;
    std::string summary;
};

/// Writes every file in the order of options.outputs(), then standard output, then gives the files
/// their names.
bool write_all(const FitOptions& options, const Results& results, OutputFiles& files,
               std::string& problem) {
    if (options.csv && !files.write_next(results.csv, problem)) return false;
    if (options.json && options.json != "-" && !files.write_next(results.json, problem))
        return false;
    if (options.yaml && !files.write_next(results.yaml, problem)) return false;
    if (options.chart && options.chart != "-" && !files.write_next(results.chart, problem))
        return false;
    std::string shown = options.json == "-" ? results.json : results.summary;
    if (options.chart == "-") shown += "\n" + results.chart;
    return finish(files, shown, problem);
}

/// Draws and writes, once everything is known to be right.
ExitStatus deliver(const FitOptions& options, const Messages& messages, const ShownFit& shown,
                   const Diagnostics& diagnostics) {
    std::string problem;
    Results results;
    if (options.yaml) {
        auto yaml = fit_yaml(shown, options.law, problem);
        if (!yaml) {
            messages.error("--yaml: " + problem + "; nothing was written");
            return ExitStatus::wrong_input;
        }
        results.yaml = *std::move(yaml);
    }
    OutputFiles files;
    if (!open_all(files, options.outputs(), problem)) return cannot_write(messages, problem);
    messages.show(diagnostics);
    if (options.chart) {
        Chart chart = fit_chart(shown, {*chart_format(*options.chart), options.units});
        if (!chart.bytes) return cannot_draw("fit", messages, chart);
        results.chart = *std::move(chart.bytes);
    }
    if (options.csv) results.csv = fit_csv(shown);
    if (options.json) results.json = fit_json(shown, listed(diagnostics));
    if (options.json != "-") results.summary = fit_summary(shown, {options.units});
    if (!write_all(options, results, files, problem)) return cannot_write(messages, problem);
    return ExitStatus::done;
}

}  // namespace

ExitStatus run_fit(const FitOptions& options) {
    const Messages messages(options.quiet);
    Diagnostics diagnostics;
    auto text = read_file(options.input, diagnostics);
    if (!text) return refuse(messages, diagnostics);
    const bool described = has_yaml_ending(options.input) || begins_as_yaml(*text);
    std::string problem = described ? misplaced(options) : std::string();
    if (!problem.empty()) return wrong_usage("fit", problem);
    auto test = described ? read_described(options.input, *std::move(text), diagnostics)
                          : read_plain(options, *std::move(text), diagnostics);
    if (!test) return refuse(messages, diagnostics);
    problem = late_problem(options, *test);
    if (!problem.empty()) return wrong_usage("fit", problem);
    const auto shown = fitted(*std::move(test), diagnostics);
    if (!shown) return refuse(messages, diagnostics);
    return deliver(options, messages, *shown, diagnostics);
}

}  // namespace rainledger
