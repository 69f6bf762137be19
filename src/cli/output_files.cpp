#include "cli/output_files.hpp"

#include <array>
#include <cstddef>
#include <cstring>
#include <filesystem>
#include <optional>
#include <system_error>
#include <utility>

#include <limits.h>
#include <signal.h>
#include <unistd.h>

#include "rainledger/cli/exit_status.hpp"

namespace rainledger {
namespace {

constexpr std::array kInterrupts{SIGINT, SIGTERM, SIGHUP};
constexpr std::size_t kMostFiles = 8;

/// The temporary files to remove after a signal. A handler sees nothing but static storage; this is
/// the program's only piece of it, changed only while the signals are blocked.
struct TemporaryNames {
    std::array<std::array<char, PATH_MAX>, kMostFiles> paths{};
    std::size_t count = 0;
};

TemporaryNames& temporary_names() {
    static constinit TemporaryNames names;
    return names;
}

/// Calls nothing that POSIX does not list as safe in a signal handler.
void remove_and_leave(int /*signal*/) {
    const TemporaryNames& names = temporary_names();
    for (std::size_t i = 0; i < names.count; ++i)
        ::unlink(names.paths[i].data());
    ::_exit(static_cast<int>(ExitStatus::interrupted));
}

/// Holds the interrupts back for its lifetime.
class InterruptsBlocked {
public:
    InterruptsBlocked() {
        sigset_t blocked;
        ::sigemptyset(&blocked);
        for (const int signal : kInterrupts)
            ::sigaddset(&blocked, signal);
        ::sigprocmask(SIG_BLOCK, &blocked, &before_);
    }
    InterruptsBlocked(const InterruptsBlocked&) = delete;
    InterruptsBlocked& operator=(const InterruptsBlocked&) = delete;
    ~InterruptsBlocked() { ::sigprocmask(SIG_SETMASK, &before_, nullptr); }

private:
    sigset_t before_{};
};

/// Whether the destination is written directly (a device, a pipe): opening it may wait for a reader
/// for as long as it likes, and leaves no temporary file.
bool is_written_directly(const std::string& path) {
    std::error_code ignored;
    return std::filesystem::exists(path, ignored) &&
           !std::filesystem::is_regular_file(path, ignored);
}

bool remember(const std::string& path) {
    TemporaryNames& names = temporary_names();
    if (path.size() >= PATH_MAX || names.count == kMostFiles) return false;
    std::memcpy(names.paths[names.count].data(), path.c_str(), path.size() + 1);
    ++names.count;
    return true;
}

}  // namespace

void catch_signals() {
    struct sigaction action {};
    action.sa_handler = remove_and_leave;
    ::sigfillset(&action.sa_mask);
    for (const int signal : kInterrupts) {
        struct sigaction before {};
        ::sigaction(signal, nullptr, &before);
        // A caller that had the signal ignored (nohup) keeps it so.
        if (before.sa_handler != SIG_IGN) ::sigaction(signal, &action, nullptr);
    }
    ::signal(SIGPIPE, SIG_IGN);
    ::signal(SIGXFSZ, SIG_IGN);
}

OutputFiles::~OutputFiles() {
    const InterruptsBlocked blocked;
    files_.clear();
    temporary_names().count = 0;
}

bool OutputFiles::open(const std::string& path, std::string& problem) {
    std::optional<InterruptsBlocked> blocked;
    if (!is_written_directly(path)) blocked.emplace();
    std::string why;
    std::optional<WholeFile> file = WholeFile::open(path, why);
    if (file && !file->temporary_path().empty() && !remember(file->temporary_path())) {
        file.reset();
        why = std::system_category().message(ENAMETOOLONG);
    }
    if (!file) {
        problem = path + ": " + why;
        return false;
    }
    files_.push_back(std::move(*file));
    return true;
}

bool OutputFiles::write_next(std::string_view content, std::string& problem) {
    WholeFile& file = files_[written_++];
    if (file.write(content, problem)) return true;
    problem.insert(0, file.path() + ": ");
    return false;
}

bool OutputFiles::commit(std::string& problem) {
    const InterruptsBlocked blocked;
    for (WholeFile& file : files_) {
        if (file.commit(problem)) continue;
        problem.insert(0, file.path() + ": ");
        return false;
    }
    temporary_names().count = 0;
    return true;
}

}  // namespace rainledger
