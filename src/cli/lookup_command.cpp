#include "cli/lookup_command.hpp"

#include "rainledger/report/lookup_report.hpp"

namespace rainledger {
namespace {

/// Sentences of the JSON hold canonical units, those of the text what was asked for.
LookupAnswer look_up(const LookupOptions& options, DisplayUnits units) {
    LookupAsked asked = options.asked;
    asked.units = units;
    return options.topic->look_up(asked);
}

bool write_all(const LookupOptions& options, OutputFiles& files,
               std::span<const LookupSection> sections, std::string& problem) {
    const std::string json = options.json ? lookup_json(sections) : std::string();
    if (options.json == "-") return finish(files, json, problem);
    if (options.json && !files.write_next(json, problem)) return false;
    const LookupAnswer shown = look_up(options, options.asked.units);
    return finish(files, lookup_text(*shown.value, {options.asked.units}), problem);
}

ExitStatus list_topics(const Messages& messages) {
    std::string problem;
    const std::string text = "Topics of rainledger lookup:\n\n" + topic_lines() +
                             "\nA topic without a name shows its whole table; --help says more.\n";
    if (write_results(text, problem)) return ExitStatus::done;
    return cannot_write(messages, "standard output: " + problem);
}

}  // namespace

ExitStatus run_lookup(const LookupOptions& options) {
    const Messages messages(options.quiet);
    if (options.topic == nullptr) return list_topics(messages);
    const LookupAnswer answer = look_up(options, DisplayUnits::metric);
    if (!answer.value)
        return wrong_usage("lookup",
                           answer.problem + (answer.hint.empty() ? "" : "; " + answer.hint));
    std::string problem;
    OutputFiles files;
    if (!open_all(files, options.outputs(), problem)) return cannot_write(messages, problem);
    for (const std::string& warning : lookup_warnings(*answer.value))
        messages.note(warning);
    if (!write_all(options, files, *answer.value, problem)) return cannot_write(messages, problem);
    return ExitStatus::done;
}

}  // namespace rainledger
