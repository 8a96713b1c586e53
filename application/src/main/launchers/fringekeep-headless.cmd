@echo off
rem The headless program: plain Java over the program's own modules, without any jar of the window platform.
rem Folders with an asterisk stand for the jars in them: a list of all jars would not fit into one variable.
setlocal enabledelayedexpansion
set "home=%~dp0.."
set "java=java"
if defined JAVA_HOME set "java=%JAVA_HOME%\bin\java"
set "jars=%home%\fringekeep\modules\*"
for /d %%d in ("%home%\fringekeep\modules\ext\*") do (
  if /i not "%%~nxd"=="fringekeep.desk" call :folder "%%d"
)
"%java%" -XX:+UseSerialGC -Djava.awt.headless=true -cp "!jars!" fringekeep.commandline.Main %*
exit /b %errorlevel%

:folder
set "jars=!jars!;%~1\*"
for /d /r "%~1" %%e in (*) do set "jars=!jars!;%%e\*"
exit /b 0
