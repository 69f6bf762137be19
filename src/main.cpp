#include <exception>
#include <string>
#include <string_view>
#include <vector>

#include "cli/output_files.hpp"
#include "cli/program.hpp"
#include "cli/terminal.hpp"
#include "rainledger/cli/exit_status.hpp"

namespace {

int fault(std::string_view what) {
    rainledger::Messages(false).error("a fault of the program itself (" + std::string(what) +
                                      "); please report it with the files that led to it");
    return static_cast<int>(rainledger::ExitStatus::fault);
}

}  // namespace

int main(int argc, char** argv) {
    rainledger::keep_standard_descriptors();
    rainledger::catch_signals();
    try {
        const std::vector<std::string> words(argv + (argc > 0 ? 1 : 0), argv + argc);
        return static_cast<int>(rainledger::run_program(words));
    } catch (const std::exception& error) {
        return fault(error.what());
    } catch (...) {
        return fault("of no known kind");
    }
}
