#pragma once

#include <optional>
#include <span>
#include <string>
#include <string_view>
#include <vector>

#include "cli/output_files.hpp"
#include "cli/terminal.hpp"
#include "rainledger/base/diagnostic.hpp"
#include "rainledger/chart/chart.hpp"
#include "rainledger/cli/exit_status.hpp"
#include "rainledger/scenario/scenario.hpp"

// The files of one run, read and written: what every command that has some shares.
namespace rainledger {

/// Ends a run whose input is wrong; an unreadable file counts less than a wrong one.
[[nodiscard]] ExitStatus refuse(const Messages& messages, const Diagnostics& diagnostics);

/// Ends a run for a command line that is wrong.
[[nodiscard]] ExitStatus wrong_usage(std::string_view command, std::string_view problem);

/// Every diagnostic as the JSON lists it: "FILE:LINE:COLUMN: MESSAGE".
[[nodiscard]] std::vector<std::string> listed(const Diagnostics& diagnostics);

/// An output file that the command line names.
struct Output {
    std::string_view option;  ///< "ledger"
    std::string path;
};
/// Adds the file of an option, if it was given and is not "-".
void add_output(std::vector<Output>& outputs, std::string_view option,
                const std::optional<std::string>& path);

/// What is wrong with the outputs: two that are one file, one that is the input itself, or two
/// results on standard output. `noun` is "scenario".
[[nodiscard]] std::string outputs_problem(std::span<const Output> outputs, const std::string& input,
                                          std::string_view noun);
[[nodiscard]] std::string standard_output_problem(const std::optional<std::string>& json,
                                                  const std::optional<std::string>& chart);
/// What is wrong with them once it is known what the storms were read from.
[[nodiscard]] std::string rain_files_problem(std::span<const Output> outputs,
                                             std::span<const Storm> storms);

/// The names of storms or surfaces.
template <class Named>
[[nodiscard]] std::vector<std::string> names_of(const std::vector<Named>& items) {
    std::vector<std::string> names;
    names.reserve(items.size());
    for (const Named& item : items)
        names.push_back(item.name);
    return names;
}
/// The names, of very many the first and a count: "a, b, c and 5 more".
[[nodiscard]] std::string first_names(std::span<const std::string> names);
/// What is wrong with a name that chooses one of `names`: the nearest one, or those names.
[[nodiscard]] std::string name_problem(std::string_view option, const std::string& typed,
                                       std::span<const std::string> names);

/// Opens every output, in order.
[[nodiscard]] bool open_all(OutputFiles& files, std::span<const Output> outputs,
                            std::string& problem);
/// Writes standard output and then gives the files their names.
[[nodiscard]] bool finish(OutputFiles& files, std::string_view shown, std::string& problem);
/// Ends a run whose results could not be written.
[[nodiscard]] ExitStatus cannot_write(const Messages& messages, const std::string& problem);
/// Ends a run whose chart could not be drawn, or of which too much was asked.
[[nodiscard]] ExitStatus cannot_draw(std::string_view command, const Messages& messages,
                                     const Chart& chart);

}  // namespace rainledger
