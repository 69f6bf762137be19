#include "chart/gnuplot.hpp"

#include <array>
#include <cerrno>
#include <csignal>
#include <cstddef>
#include <optional>
#include <system_error>
#include <utility>

#include <spawn.h>
#include <sys/mman.h>
#include <sys/wait.h>
#include <unistd.h>

#include "rainledger/base/cut.hpp"
#include "rainledger/base/printable.hpp"
#include "rainledger/base/whole_file.hpp"

namespace rainledger {
namespace {

constexpr std::string_view kInstallHint =
    "install it (Debian: apt install gnuplot-nox); everything but charts works without it";
constexpr std::string_view kTerminalHint =
    "charts need gnuplot 5.4 or later with its terminals svg, pngcairo and pdfcairo";

/// A file in memory, open in this process alone. The child's three streams are such files and not
/// pipes: neither side can wait for the other, and writing never meets a reader that has died.
class MemoryFile {
public:
    explicit MemoryFile(const char* name) : descriptor_(::memfd_create(name, MFD_CLOEXEC)) {}
    MemoryFile(const MemoryFile&) = delete;
    MemoryFile& operator=(const MemoryFile&) = delete;
    ~MemoryFile() {
        if (descriptor_ >= 0) ::close(descriptor_);
    }

    [[nodiscard]] int descriptor() const { return descriptor_; }

    /// Writes `text` and goes back to the start; 0 or the errno of what stopped it.
    [[nodiscard]] int fill(std::string_view text) const {
        const int error = write_all(descriptor_, text);
        if (error != 0) return error;
        return ::lseek(descriptor_, 0, SEEK_SET) == 0 ? 0 : errno;
    }

    [[nodiscard]] std::string content() const {
        std::string out;
        std::array<char, std::size_t{1} << 16U> part{};
        while (true) {
            const ssize_t got =
                ::pread(descriptor_, part.data(), part.size(), static_cast<off_t>(out.size()));
            if (got < 0 && errno == EINTR) continue;
            if (got <= 0) return out;
            out.append(part.data(), static_cast<std::size_t>(got));
        }
    }

private:
    int descriptor_;
};

/// The streams that the child gets, and its signals as they are at the start of a process.
class SpawnSettings {
public:
    SpawnSettings() {
        ::posix_spawn_file_actions_init(&actions_);
        ::posix_spawnattr_init(&attributes_);
        sigset_t none;
        sigset_t usual;
        ::sigemptyset(&none);
        ::sigemptyset(&usual);
        for (const int signal : {SIGPIPE, SIGINT, SIGTERM, SIGHUP})
            ::sigaddset(&usual, signal);
        ::posix_spawnattr_setsigmask(&attributes_, &none);
        ::posix_spawnattr_setsigdefault(&attributes_, &usual);
        ::posix_spawnattr_setflags(&attributes_, POSIX_SPAWN_SETSIGMASK | POSIX_SPAWN_SETSIGDEF);
    }
    SpawnSettings(const SpawnSettings&) = delete;
    SpawnSettings& operator=(const SpawnSettings&) = delete;
    ~SpawnSettings() {
        ::posix_spawn_file_actions_destroy(&actions_);
        ::posix_spawnattr_destroy(&attributes_);
    }

    [[nodiscard]] bool stream(const MemoryFile& file, int stream) {
        return ::posix_spawn_file_actions_adddup2(&actions_, file.descriptor(), stream) == 0;
    }
    [[nodiscard]] const posix_spawn_file_actions_t* actions() const { return &actions_; }
    [[nodiscard]] const posix_spawnattr_t* attributes() const { return &attributes_; }

private:
    posix_spawn_file_actions_t actions_{};
    posix_spawnattr_t attributes_{};
};

Chart no_chart(std::string problem, std::string_view hint) {
    return {std::nullopt, std::move(problem), std::string(hint)};
}

Chart system_trouble(std::string_view doing, int error) {
    return no_chart(std::string(doing) + ": " + std::system_category().message(error), "");
}

/// The last line in which gnuplot says something: the lines before it show the script.
std::string last_words(const std::string& said) {
    const std::size_t last = said.find_last_not_of(" \t\r\n^");
    if (last == std::string::npos) return "it drew nothing and said nothing";
    const std::size_t before = said.find_last_of('\n', last);
    const std::size_t first = before == std::string::npos ? 0 : before + 1;
    constexpr std::size_t kMostCharacters = 160;
    return cut(printable(std::string_view(said).substr(first, last + 1 - first)), kMostCharacters);
}

/// Whether the child ended well. Where the system reaps children by itself nobody can tell, and
/// what it wrote decides.
bool ended_well(pid_t child) {
    int status = 0;
    while (::waitpid(child, &status, 0) < 0)
        if (errno != EINTR) return true;
    return WIFEXITED(status) && WEXITSTATUS(status) == 0;
}

}  // namespace

Chart run_gnuplot(std::string_view script) {
    const MemoryFile in("script");
    const MemoryFile out("picture");
    const MemoryFile said("messages");
    if (in.descriptor() < 0 || out.descriptor() < 0 || said.descriptor() < 0)
        return system_trouble("no room for the chart in memory", errno);
    if (const int error = in.fill(script); error != 0)
        return system_trouble("no room for the chart in memory", error);

    SpawnSettings settings;
    if (!settings.stream(in, STDIN_FILENO) || !settings.stream(out, STDOUT_FILENO) ||
        !settings.stream(said, STDERR_FILENO))
        return system_trouble("gnuplot could not be started", ENOMEM);
    std::string name = "gnuplot";
    std::string no_settings = "-d";
    std::array<char*, 3> arguments{name.data(), no_settings.data(), nullptr};
    pid_t child = 0;
    const int error = ::posix_spawnp(&child, name.c_str(), settings.actions(),
                                     settings.attributes(), arguments.data(), environ);
    if (error == ENOENT) return no_chart("gnuplot is not installed", kInstallHint);
    if (error != 0) return system_trouble("gnuplot could not be started", error);

    const bool well = ended_well(child);
    std::string bytes = out.content();
    if (well && !bytes.empty()) return {std::move(bytes), {}, {}};
    return no_chart("gnuplot could not draw the chart: " + last_words(said.content()),
                    kTerminalHint);
}

}  // namespace rainledger
