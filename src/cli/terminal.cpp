#include "cli/terminal.hpp"

#include <cerrno>
#include <cstddef>
#include <cstdlib>
#include <system_error>

#include <fcntl.h>
#include <unistd.h>

#include "rainledger/base/printable.hpp"
#include "rainledger/base/whole_file.hpp"

namespace rainledger {
namespace {

constexpr std::size_t kMostErrors = 50;

void print_error_text(std::string_view text) {
    // There is nowhere left to tell of a failure here.
    static_cast<void>(write_all(STDERR_FILENO, text));
}

bool wants_colour() {
    const char* const no_colour = std::getenv("NO_COLOR");
    if (no_colour != nullptr && *no_colour != '\0') return false;
    const char* const terminal = std::getenv("TERM");
    if (terminal == nullptr || std::string_view(terminal) == "dumb") return false;
    return ::isatty(STDERR_FILENO) == 1;
}

}  // namespace

void keep_standard_descriptors() {
    // open() takes the lowest free number, so each closed one is filled in turn; for reading only,
    // so that results written to a closed standard output are told as lost.
    for (int descriptor = STDIN_FILENO; descriptor <= STDERR_FILENO; ++descriptor)
        if (::fcntl(descriptor, F_GETFD) == -1 && ::open("/dev/null", O_RDONLY) == -1) return;
}

bool write_results(std::string_view text, std::string& problem) {
    const int error = write_all(STDOUT_FILENO, text);
    if (error == 0 || error == EPIPE) return true;
    problem = std::system_category().message(error);
    return false;
}

Messages::Messages(bool quiet) : quiet_(quiet), colour_(wants_colour()) {}

void Messages::print(std::string_view text) const {
    print_error_text(text);
}

void Messages::error(std::string_view text) const {
    print("rainledger: " + printable(text) + "\n");
}

void Messages::note(std::string_view text) const {
    if (!quiet_) print("rainledger: note: " + printable(text) + "\n");
}

void Messages::show(const Diagnostics& diagnostics) const {
    std::string out;
    std::size_t errors = 0;
    for (const Diagnostic& diagnostic : diagnostics.list()) {
        const bool is_error = diagnostic.severity == Severity::error;
        if (is_error && ++errors > kMostErrors) continue;
        if (is_error || !quiet_) out += render(diagnostic, colour_);
    }
    if (errors > kMostErrors)
        out += "rainledger: " + std::to_string(errors - kMostErrors) + " more errors not shown\n";
    print(out);
}

void print_wrong_usage(std::string_view command, std::string_view problem) {
    std::string name = "rainledger";
    if (!command.empty()) name += " " + std::string(command);
    print_error_text(printable(name + ": " + std::string(problem)) + "\nSee '" + name +
                     " --help'.\n");
}

}  // namespace rainledger
